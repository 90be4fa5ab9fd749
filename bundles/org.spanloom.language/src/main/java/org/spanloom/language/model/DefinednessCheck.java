/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Collections;
import java.util.HashSet;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.BooleanSupplier;
import java.util.function.Supplier;
import org.spanloom.language.model.LinearForm.MatrixEntry;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * Reports coefficients that have no finite value somewhere inside the interval, each place in the
 * text once. A named expression at fault is reported where it is declared and not again where it is
 * used.
 */
final class DefinednessCheck {

  /**
   * Deeper terms are not looked through for being plain; bounds the work on terms that share parts.
   */
  private static final int PLAIN_DEPTH = 8;

  private final SystemScope system;
  private final Times times;
  private final double start;
  private final BooleanSupplier cancelled;
  private final KnownConstants constants = new KnownConstants();
  private final KnownRanges ranges;
  private final SearchBudget budget = new SearchBudget();
  private boolean spentReported;
  private final Set<Let> faulty = Collections.newSetFromMap(new IdentityHashMap<>());
  private final Set<Span> reported = new HashSet<>();

  /**
   * Prepares.
   *
   * @param start a time from which one looks to both sides, in the unit of time
   */
  DefinednessCheck(SystemScope system, Times times, double start, BooleanSupplier cancelled) {
    this.system = system;
    this.times = times;
    this.start = start;
    this.cancelled = cancelled;
    TimeInterval interval = times.interval();
    this.ranges =
        new KnownRanges(
            new Interval(
                times.unit().toBase(interval.start()), times.unit().toBase(interval.end())));
  }

  void lets(List<Let> lets) {
    for (Let let : lets) {
      ModelReader.check(cancelled);
      Optional<Interval> range = ranges.range(let.value());
      if (range.isPresent()) {
        ranges.note(let, range.get());
      } else if (!isFine(let.value(), let.span(), let.nameSpan(), () -> "\"" + let.name() + "\"")) {
        faulty.add(let);
      }
    }
  }

  void equations(LinearForm form) {
    int[] entriesOfRow = new int[form.dimension()];
    form.mass().forEach(e -> entriesOfRow[e.row()]++);
    for (MatrixEntry entry : form.mass()) {
      boolean alone = entriesOfRow[entry.row()] == 1;
      entry(entry.term(), entry.sources());
      if (alone && !reported.contains(entry.sources().getFirst())) {
        leading(entry);
      }
    }
    form.matrix().forEach(e -> entry(e.term(), e.sources()));
    form.forcing().forEach(e -> entry(e.term(), e.sources()));
  }

  /** Checks the factor of the only derivative of an equation, by which the equation is divided. */
  private void leading(MatrixEntry entry) {
    if (entry.term() instanceof Term.Constant(double value) && value != 0) {
      return;
    }
    Span span = entry.sources().getFirst();
    isFine(
        new Term.Quotient(Term.ONE, entry.term()),
        span,
        span,
        () ->
            "The equation divided by the factor of the derivative in \""
                + system.resolver().shown(span)
                + "\"");
  }

  void outputs(List<Output> outputs) {
    for (Output output : outputs) {
      output.value().samples().forEach(s -> entry(s.coefficient(), List.of(output.value().span())));
      entry(output.value().constant(), List.of(output.value().span()));
    }
  }

  void closedForms(List<Basis> bases) {
    for (Basis basis : bases) {
      if (basis instanceof Basis.ClosedForm closed) {
        for (int i = 0; i < closed.rows().size(); i++) {
          for (Term term : closed.rows().get(i)) {
            entry(term, List.of(closed.rowSpans().get(i)));
          }
        }
      }
    }
  }

  private void entry(Term term, List<Span> sources) {
    Span span = sources.getFirst();
    isFine(term, span, span, () -> "\"" + system.resolver().shown(span) + "\"");
  }

  private boolean isFine(Term term, Span place, Span shown, Supplier<String> what) {
    ModelReader.check(cancelled);
    boolean bounded = times.interval().isBounded();
    boolean trivial = isPlain(term, 0) || !bounded && Simplifier.surelyHasAValue(term);
    if (trivial || constants.isKnown(term) || system.problems().isFull() || usesFaulty(term)) {
      return true;
    }
    if (ranges.range(term).isPresent() || isSpent(shown)) {
      return true;
    }
    TermTape tape = TermTape.of(term);
    DefinednessSearch search =
        new DefinednessSearch(tape, times.interval(), times.unit(), start, budget);
    return switch (search.result()) {
      case Definedness.Defined defined -> true;
      case Definedness.Undefined undefined -> {
        boolean beyondNumbers =
            undefined.cause() == Definedness.Cause.OVERFLOW && !times.interval().isBounded();
        if (!beyondNumbers && reported.add(place)) {
          report(undefined, shown, what.get());
        }
        yield beyondNumbers;
      }
      case Definedness.Undecided undecided -> {
        if (reported.add(place)) {
          system
              .problems()
              .report(
                  ProblemKind.COEFFICIENT_UNDECIDED,
                  shown,
                  "It could not be shown that "
                      + what.get()
                      + " is finite from "
                      + at(undecided.time())
                      + " on: "
                      + undecided.reason()
                      + ". Check its divisors, roots and logarithms there.");
        }
        yield true;
      }
    };
  }

  /** Tells whether no more is looked at closely; reports the first term that this leaves out. */
  private boolean isSpent(Span shown) {
    if (budget.isSpent() && !spentReported) {
      spentReported = true;
      system
          .problems()
          .report(
              ProblemKind.COEFFICIENT_UNDECIDED,
              shown,
              "From here on it was not looked whether expressions are finite everywhere: those"
                  + " before took up the work that is spent on this. Make them simpler.");
    }
    return budget.isSpent();
  }

  /**
   * Tells whether a small term is made of sums and products only, which have a value everywhere.
   */
  private static boolean isPlain(Term term, int depth) {
    return depth < PLAIN_DEPTH
        && switch (term) {
          case Term.Constant number -> Double.isFinite(number.value());
          case Term.ParameterTerm parameter -> true;
          case Term.LetTerm let -> true;
          case Term.Time time -> true;
          case Term.Negation(Term a) -> isPlain(a, depth + 1);
          case Term.Sum(Term a, Term b) -> isPlain(a, depth + 1) && isPlain(b, depth + 1);
          case Term.Difference(Term a, Term b) -> isPlain(a, depth + 1) && isPlain(b, depth + 1);
          case Term.Product(Term a, Term b) -> isPlain(a, depth + 1) && isPlain(b, depth + 1);
          case Term.Quotient(Term a, Term b) ->
              b instanceof Term.Constant(double divisor) && divisor != 0 && isPlain(a, depth + 1);
          case Term.Power power -> false;
          case Term.Switch choice -> false;
          case Term.Pulse pulse -> false;
          case Term.CurveTerm curve -> true;
          case Term.FunctionTerm call -> false;
        };
  }

  private boolean usesFaulty(Term term) {
    if (faulty.isEmpty()) {
      return false;
    }
    TermTape tape = TermTape.of(term);
    for (int i = 0; i < tape.size(); i++) {
      if (tape.node(i) instanceof Term.LetTerm(Let let) && faulty.contains(let)) {
        return true;
      }
    }
    return false;
  }

  private void report(Definedness.Undefined undefined, Span span, String what) {
    String cause = undefined.cause().wording() + culprit(undefined.operand());
    if (undefined.always()) {
      system
          .problems()
          .report(
              ProblemKind.COEFFICIENT_UNDEFINED,
              span,
              what + " has no finite value at any time: " + cause + ". Check its parameters.");
      return;
    }
    boolean atStart = undefined.from() >= undefined.to();
    system
        .problems()
        .report(
            ProblemKind.COEFFICIENT_UNDEFINED,
            span,
            what
                + " has no finite value at "
                + at(undefined.time())
                + ": "
                + cause
                + (atStart
                    ? ". Start the interval elsewhere."
                    : ". The largest interval around the start on which it is defined is "
                        + largest(undefined)
                        + ": keep to it, or change the expression."));
  }

  private static String culprit(Term operand) {
    return switch (operand) {
      case Term.ParameterTerm(Parameter parameter) -> " (" + parameter.name() + ")";
      case Term.LetTerm(Let let) -> " (" + let.name() + ")";
      default -> "";
    };
  }

  private String largest(Definedness.Undefined undefined) {
    TimeInterval whole = times.interval();
    boolean ownStart = undefined.from() <= whole.start();
    boolean ownEnd = undefined.to() >= whole.end();
    String left =
        ownStart && Double.isInfinite(whole.start())
            ? ""
            : (ownStart && !whole.startOpen() ? "from " : "after ")
                + Times.number(undefined.from());
    String right =
        ownEnd && Double.isInfinite(whole.end())
            ? ""
            : (ownEnd && !whole.endOpen() ? "to " : "before ") + Times.number(undefined.to());
    String both = left.isEmpty() || right.isEmpty() ? left + right : left + " " + right;
    return both + unit();
  }

  private String at(double time) {
    return system.scope().timeName() + " = " + Times.number(time) + unit();
  }

  private String unit() {
    return times.unit().equals(UnitOfMeasure.ONE) ? "" : " [" + times.unit().code() + "]";
  }

  /**
   * Returns a time of the interval at which something stands: its left end, else a time of initial
   * values or of a basis.
   */
  static double start(Times times, List<InitialValues> values, List<Basis> bases) {
    if (Double.isFinite(times.interval().start())) {
      return times.interval().start();
    }
    Optional<Term> named =
        values.stream()
            .map(InitialValues::time)
            .findFirst()
            .or(() -> bases.stream().flatMap(b -> time(b).stream()).findFirst());
    return named.map(t -> times.unit().fromBase(TermEvaluator.constant(t))).orElse(0.0);
  }

  private static Optional<Term> time(Basis basis) {
    return switch (basis) {
      case Basis.Principal principal -> Optional.of(principal.time());
      case Basis.Given given -> Optional.of(given.time());
      case Basis.ClosedForm closed -> Optional.empty();
    };
  }
}
