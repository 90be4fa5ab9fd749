/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import org.eclipse.jdt.internal.compiler.CompilationResult;
import org.eclipse.jdt.internal.compiler.DefaultErrorHandlingPolicies;
import org.eclipse.jdt.internal.compiler.ast.CompilationUnitDeclaration;
import org.eclipse.jdt.internal.compiler.batch.CompilationUnit;
import org.eclipse.jdt.internal.compiler.classfmt.ClassFileConstants;
import org.eclipse.jdt.internal.compiler.impl.CompilerOptions;
import org.eclipse.jdt.internal.compiler.parser.Parser;
import org.eclipse.jdt.internal.compiler.problem.DefaultProblemFactory;
import org.eclipse.jdt.internal.compiler.problem.ProblemReporter;

/** The parser of the Eclipse Java compiler: text to syntax tree, bodies of methods included. */
final class EclipseParser {

  private final CompilerOptions options = new CompilerOptions();

  EclipseParser() {
    options.complianceLevel = ClassFileConstants.JDK21;
    options.sourceLevel = ClassFileConstants.JDK21;
    options.targetJDK = ClassFileConstants.JDK21;
  }

  /** Returns the tree of a text; it must have no errors. */
  CompilationUnitDeclaration parse(char[] text) {
    ProblemReporter reporter =
        new ProblemReporter(
            DefaultErrorHandlingPolicies.proceedWithAllProblems(),
            options,
            new DefaultProblemFactory());
    CompilationUnit unit = new CompilationUnit(text, "HeatMain.java", "UTF-8");
    CompilationResult result = new CompilationResult(unit, 0, 1, options.maxProblemsPerUnit);
    CompilationUnitDeclaration tree = new Parser(reporter, true).parse(unit, result);
    if (result.hasErrors()) {
      throw new IllegalStateException(result.getErrors()[0].getMessage());
    }
    return tree;
  }
}
