/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.lang.invoke.MethodHandles;
import java.util.ArrayList;
import java.util.List;
import org.objectweb.asm.ClassWriter;
import org.objectweb.asm.Label;
import org.objectweb.asm.MethodVisitor;
import org.objectweb.asm.Opcodes;
import org.spanloom.language.model.Curve;

/**
 * Writes a {@link Program} as classes of its own, in JVM byte code.
 *
 * <p>Nodes that are used twice, and nodes on top of a high tree, get a variable, written once. The
 * code is cut into methods of a few kilobytes, because the just-in-time compiler leaves larger ones
 * (8,000 bytes on HotSpot) uncompiled; variables are locals where one method suffices, else entries
 * of an array that the methods share.
 */
final class ProgramWriter {

  /**
   * Nodes higher than this get a variable, which bounds recursion here and the operand stack of the
   * code.
   */
  private static final int HIGHEST = 30;

  /** Trees of more nodes than this get a variable, which bounds the code of one value. */
  private static final int LARGEST = 200;

  /** Estimated bytes of code in a method, well below the limit of the just-in-time compiler. */
  private static final int METHOD_BYTES = 5_000;

  /**
   * Methods of a class; 20 of them hold at most 33,000 of the 65,535 constants that a class may
   * have.
   */
  private static final int METHODS = 20;

  /** Largest number of local variables of the one-method form. */
  private static final int LOCALS = 200;

  private static final String NAME = "org/spanloom/analysis/coefficients/CompiledProgram";
  private static final String STRICT_MATH = "java/lang/StrictMath";
  private static final String CURVE = Curve.class.getName().replace('.', '/');
  private static final String PART = "(D[D[D[L" + CURVE + ";)V";

  private final TermGraph graph;
  private final int[] height;
  private final int[] weight;
  private final int[] uses;
  private final int[] variable;
  private boolean sharedVariables;

  private ProgramWriter(TermGraph graph) {
    this.graph = graph;
    this.height = new int[graph.size()];
    this.weight = new int[graph.size()];
    this.uses = new int[graph.size()];
    this.variable = new int[graph.size()];
  }

  /**
   * Compiles.
   *
   * @param graph the terms
   * @param targets for each place of the output the node to store there, or -1 for a place to leave
   *     alone
   */
  static Program write(TermGraph graph, int[] targets) {
    return new ProgramWriter(graph).write(targets);
  }

  /** One thing to do: compute a variable, or store a value at a place of the output. */
  private record Step(int node, int place) {}

  private Program write(int[] targets) {
    for (int target : targets) {
      if (target >= 0) {
        uses[target]++;
      }
    }
    for (int i = graph.size() - 1; i >= 0; i--) {
      if (uses[i] > 0) {
        TermGraph.Node node = graph.node(i);
        if (node.left() >= 0) {
          uses[node.left()]++;
        }
        if (node.right() >= 0) {
          uses[node.right()]++;
        }
        if (node.third() >= 0) {
          uses[node.third()]++;
        }
      }
    }
    List<Step> steps = new ArrayList<>();
    int variables = 0;
    for (int i = 0; i < graph.size(); i++) {
      variable[i] = -1;
      TermGraph.Node node = graph.node(i);
      boolean leaf = node.left() < 0;
      int highest = Math.max(of(height, node.left()), of(height, node.right()));
      height[i] = leaf ? 0 : 1 + Math.max(highest, of(height, node.third()));
      weight[i] = 1 + of(weight, node.left()) + of(weight, node.right()) + of(weight, node.third());
      boolean large = height[i] > HIGHEST || weight[i] > LARGEST;
      if (uses[i] > 0 && !leaf && (uses[i] > 1 || large)) {
        variable[i] = variables++;
        height[i] = 0;
        weight[i] = 1;
        steps.add(new Step(i, -1));
      }
    }
    for (int place = 0; place < targets.length; place++) {
      if (targets[place] >= 0) {
        steps.add(new Step(targets[place], place));
      }
    }
    List<List<Step>> methods = methods(steps);
    sharedVariables = methods.size() > 1 || variables > LOCALS;
    List<LinkedProgram.Part> parts = new ArrayList<>();
    for (int from = 0; from < methods.size(); from += METHODS) {
      int to = Math.min(methods.size(), from + METHODS);
      parts.add(define(classOf(methods.subList(from, to))));
    }
    return new LinkedProgram(parts, sharedVariables ? variables : 0, graph.curves());
  }

  private static int of(int[] measure, int node) {
    return node < 0 ? 0 : measure[node];
  }

  private List<List<Step>> methods(List<Step> steps) {
    List<List<Step>> methods = new ArrayList<>();
    List<Step> part = new ArrayList<>();
    int bytes = 0;
    for (Step step : steps) {
      int size = 12 + bytes(step.node(), true);
      if (bytes + size > METHOD_BYTES && !part.isEmpty()) {
        methods.add(part);
        part = new ArrayList<>();
        bytes = 0;
      }
      part.add(step);
      bytes += size;
    }
    methods.add(part);
    return methods;
  }

  /** Estimates the code of a node from above. */
  private int bytes(int number, boolean top) {
    if (!top && variable[number] >= 0) {
      return 6;
    }
    TermGraph.Node node = graph.node(number);
    int own =
        switch (node.operation()) {
          case CONSTANT, TIME -> 3;
          case ADD, SUBTRACT, MULTIPLY, DIVIDE, NEGATE, POWER, CALL -> 4;
          case SWITCH, CURVE -> 16;
        };
    return own
        + (node.left() < 0 ? 0 : bytes(node.left(), false))
        + (node.right() < 0 ? 0 : bytes(node.right(), false))
        + (node.third() < 0 ? 0 : bytes(node.third(), false));
  }

  private byte[] classOf(List<List<Step>> methods) {
    ClassWriter out = new ClassWriter(ClassWriter.COMPUTE_FRAMES);
    out.visit(
        Opcodes.V21,
        Opcodes.ACC_FINAL | Opcodes.ACC_SUPER,
        NAME,
        null,
        "java/lang/Object",
        new String[] {LinkedProgram.Part.class.getName().replace('.', '/')});
    MethodVisitor init = out.visitMethod(0, "<init>", "()V", null, null);
    init.visitCode();
    init.visitVarInsn(Opcodes.ALOAD, 0);
    init.visitMethodInsn(Opcodes.INVOKESPECIAL, "java/lang/Object", "<init>", "()V", false);
    end(init);
    MethodVisitor run = out.visitMethod(Opcodes.ACC_PUBLIC, "run", PART, null, null);
    run.visitCode();
    for (int k = 0; k < methods.size(); k++) {
      run.visitVarInsn(Opcodes.DLOAD, 1);
      run.visitVarInsn(Opcodes.ALOAD, 3);
      run.visitVarInsn(Opcodes.ALOAD, 4);
      run.visitVarInsn(Opcodes.ALOAD, 5);
      run.visitMethodInsn(Opcodes.INVOKESTATIC, NAME, "part" + k, PART, false);
      part(out, "part" + k, methods.get(k));
    }
    end(run);
    out.visitEnd();
    return out.toByteArray();
  }

  /**
   * Arguments of a part: 0 and 1 time, 2 variables, 3 output, 4 curves; locals for variables
   * follow.
   */
  private void part(ClassWriter out, String name, List<Step> steps) {
    MethodVisitor code =
        out.visitMethod(Opcodes.ACC_PRIVATE | Opcodes.ACC_STATIC, name, PART, null, null);
    code.visitCode();
    for (Step step : steps) {
      if (step.place() >= 0) {
        code.visitVarInsn(Opcodes.ALOAD, 3);
        push(code, step.place());
        value(code, step.node(), false);
        code.visitInsn(Opcodes.DASTORE);
      } else if (sharedVariables) {
        code.visitVarInsn(Opcodes.ALOAD, 2);
        push(code, variable[step.node()]);
        value(code, step.node(), true);
        code.visitInsn(Opcodes.DASTORE);
      } else {
        value(code, step.node(), true);
        code.visitVarInsn(Opcodes.DSTORE, local(step.node()));
      }
    }
    end(code);
  }

  private int local(int node) {
    return 5 + 2 * variable[node];
  }

  private static void end(MethodVisitor code) {
    code.visitInsn(Opcodes.RETURN);
    code.visitMaxs(0, 0);
    code.visitEnd();
  }

  private static void push(MethodVisitor code, int value) {
    if (value <= Short.MAX_VALUE) {
      code.visitIntInsn(Opcodes.SIPUSH, value);
    } else {
      code.visitLdcInsn(value);
    }
  }

  private void value(MethodVisitor code, int number, boolean top) {
    if (!top && variable[number] >= 0) {
      if (sharedVariables) {
        code.visitVarInsn(Opcodes.ALOAD, 2);
        push(code, variable[number]);
        code.visitInsn(Opcodes.DALOAD);
      } else {
        code.visitVarInsn(Opcodes.DLOAD, local(number));
      }
      return;
    }
    TermGraph.Node node = graph.node(number);
    switch (node.operation()) {
      case CONSTANT -> code.visitLdcInsn(node.value());
      case TIME -> code.visitVarInsn(Opcodes.DLOAD, 0);
      case ADD -> operation(code, node, Opcodes.DADD);
      case SUBTRACT -> operation(code, node, Opcodes.DSUB);
      case MULTIPLY -> operation(code, node, Opcodes.DMUL);
      case DIVIDE -> operation(code, node, Opcodes.DDIV);
      case NEGATE -> {
        value(code, node.left(), false);
        code.visitInsn(Opcodes.DNEG);
      }
      case POWER -> power(code, node);
      case CALL -> call(code, node);
      case SWITCH -> choice(code, node);
      case CURVE -> {
        code.visitVarInsn(Opcodes.ALOAD, 4);
        push(code, (int) node.bits());
        code.visitInsn(Opcodes.AALOAD);
        value(code, node.left(), false);
        code.visitMethodInsn(Opcodes.INVOKEINTERFACE, CURVE, "at", "(D)D", true);
      }
    }
  }

  /** Runs one of two branches; a gap that is no number takes the second one. */
  private void choice(MethodVisitor code, TermGraph.Node node) {
    Label otherwise = new Label();
    Label end = new Label();
    value(code, node.left(), false);
    code.visitInsn(Opcodes.DCONST_0);
    code.visitInsn(Opcodes.DCMPG);
    code.visitJumpInsn(node.bits() == 1 ? Opcodes.IFGT : Opcodes.IFGE, otherwise);
    value(code, node.right(), false);
    code.visitJumpInsn(Opcodes.GOTO, end);
    code.visitLabel(otherwise);
    value(code, node.third(), false);
    code.visitLabel(end);
  }

  private void operation(MethodVisitor code, TermGraph.Node node, int opcode) {
    value(code, node.left(), false);
    value(code, node.right(), false);
    code.visitInsn(opcode);
  }

  private void power(MethodVisitor code, TermGraph.Node node) {
    value(code, node.left(), false);
    if (graph.isConstant(node.right()) && graph.node(node.right()).value() == 2) {
      code.visitInsn(Opcodes.DUP2);
      code.visitInsn(Opcodes.DMUL);
    } else {
      value(code, node.right(), false);
      code.visitMethodInsn(Opcodes.INVOKESTATIC, STRICT_MATH, "pow", "(DD)D", false);
    }
  }

  private void call(MethodVisitor code, TermGraph.Node node) {
    value(code, node.left(), false);
    boolean two = node.right() >= 0;
    if (two) {
      value(code, node.right(), false);
    }
    String method =
        switch (node.function()) {
          case SIN,
              COS,
              TAN,
              ASIN,
              ACOS,
              ATAN,
              SINH,
              COSH,
              TANH,
              EXP,
              LOG,
              LOG10,
              SQRT,
              ABS,
              MIN,
              MAX ->
              node.function().code();
          case SIGN -> "signum";
        };
    code.visitMethodInsn(Opcodes.INVOKESTATIC, STRICT_MATH, method, two ? "(DD)D" : "(D)D", false);
  }

  private static LinkedProgram.Part define(byte[] bytes) {
    try {
      MethodHandles.Lookup lookup = MethodHandles.lookup().defineHiddenClass(bytes, true);
      return (LinkedProgram.Part) lookup.lookupClass().getDeclaredConstructor().newInstance();
    } catch (ReflectiveOperationException e) {
      throw new IllegalStateException("the program just written cannot be loaded", e);
    }
  }
}
