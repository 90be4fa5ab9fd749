/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.coefficients.SystemCompiler;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.text.SourceText;

/** From the text of a large model to A, b and all that can be found without integration. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 5, time = 2)
@Measurement(iterations = 5, time = 2)
@Fork(1)
public class FrontEndBenchmark {

  /** Size of the model. */
  @Param({"1000", "3000", "10000", "30000", "100000"})
  public int statements;

  private String text;
  private char[] java;
  private EclipseParser eclipse;

  /** Generates the texts. */
  @Setup
  public void generate() {
    text = LargeModel.text(statements);
    java = JavaText.text(text.length()).toCharArray();
    eclipse = new EclipseParser();
  }

  /** Text to tokens. */
  @Benchmark
  public List<Token> lex() {
    return Lexer.lex(text);
  }

  /** Text to syntax tree. */
  @Benchmark
  public SyntaxFile parse() {
    return Parser.parse(new SourceText("main.span", text));
  }

  /** Java text of the same length to syntax tree, by the Eclipse Java compiler's parser. */
  @Benchmark
  public Object parseJavaByEclipse() {
    return eclipse.parse(java);
  }

  /** Text to linear form and findings. */
  @Benchmark
  public Model read() {
    return ModelReader.read(new SourceText("main.span", text));
  }

  /** Text to findings, and A and b that can be evaluated: a whole check without integration. */
  @Benchmark
  public CompiledSystem check() {
    Model model = ModelReader.read(new SourceText("main.span", text));
    if (!model.problems().isEmpty()) {
      throw new IllegalStateException(model.problems().getFirst().toString());
    }
    return SystemCompiler.compile(model.systems().getFirst(), Map.of());
  }
}
