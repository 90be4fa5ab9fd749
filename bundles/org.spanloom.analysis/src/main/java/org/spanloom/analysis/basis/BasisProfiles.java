/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.basis;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.SequencedMap;
import java.util.Set;
import java.util.stream.Collectors;
import org.spanloom.analysis.Finding;
import org.spanloom.analysis.FindingKind;
import org.spanloom.analysis.SystemSolutions;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.solve.Refusals;
import org.spanloom.language.model.Basis;
import org.spanloom.language.model.Requirement;
import org.spanloom.language.text.Span;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.JumpSelection;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.basis.ClosedFormResidual;
import org.spanloom.numerics.basis.ConditionProfile;
import org.spanloom.numerics.basis.ConditionSample;
import org.spanloom.numerics.basis.Dependence;
import org.spanloom.numerics.basis.Windows;
import org.spanloom.numerics.solution.Solution;

/**
 * The bases of one system and how far each can be trusted.
 *
 * <p>A candidate is first tested for being a basis at all: closed forms must solve the system, and
 * the columns must be independent at one time, which decides for all times. Only then its
 * conditioning is followed over the range.
 *
 * <p>That a principal basis degenerates is a property of every dissipative system, so it is a note.
 * It becomes a warning where the model relies on the basis: where it declares it, over the whole
 * range, or up to the latest {@code until} of a requirement on its condition where there is one.
 */
public final class BasisProfiles {

  /** Most states for which the principal basis is followed without being declared. */
  private static final int LARGEST_UNASKED = 200;

  private final SystemSolutions solutions;
  private final CompiledSystem system;
  private final BasisMessages messages;
  private final Map<String, Judged> judged = new LinkedHashMap<>();
  private final List<BasisReport> reports = new ArrayList<>();
  private final List<Finding> findings = new ArrayList<>();

  /** What came of a basis. */
  public sealed interface Judged {

    /**
     * It is a basis.
     *
     * @param solution its columns over the range
     * @param profile its conditioning over the range
     */
    record Fit(Solution solution, ConditionProfile profile) implements Judged {}

    /**
     * It is none, or nothing is known.
     *
     * @param why one clause for people
     */
    record Unfit(String why) implements Judged {}
  }

  /** Judges all bases of a system. */
  public BasisProfiles(SystemSolutions solutions) {
    this.solutions = solutions;
    this.system = solutions.system();
    this.messages = new BasisMessages(system, solutions.settings());
    if (system.dimension() == 0) {
      return;
    }
    if (solutions.range().isEmpty() && !system.model().bases().isEmpty()) {
      add(FindingKind.RANGE_UNBOUNDED, system.model().nameSpan(), messages.unbounded());
    }
    singularJumps();
    for (Basis basis : system.model().bases()) {
      judged.put(
          basis.name(),
          switch (basis) {
            case Basis.Principal b -> columns(BasisColumns.of(system, b), b.nameSpan());
            case Basis.Given b -> columns(BasisColumns.of(system, b), b.nameSpan());
            case Basis.ClosedForm b -> closedForm(b);
          });
    }
    if (system.model().bases().isEmpty() && solutions.range().isPresent()) {
      principal(solutions.range().get().start());
    }
  }

  /** Returns one report for each basis whose conditioning is known, in the order of the text. */
  public List<BasisReport> reports() {
    return List.copyOf(reports);
  }

  /** Returns what was found about the bases. */
  public List<Finding> findings() {
    return List.copyOf(findings);
  }

  /** Returns what came of a declared basis. */
  public Judged of(String name) {
    return judged.getOrDefault(name, new Judged.Unfit("there is no basis '" + name + "'"));
  }

  /** Where a basis is followed: a range, and the jumps that count in it. */
  private record Part(LinearSystem linear, TimeRange range) {}

  private Part whole() {
    return new Part(system.linear(), solutions.range().orElseThrow());
  }

  /** Returns the range up to the first jump behind which no basis is one. */
  private Part sound() {
    TimeRange range = solutions.range().orElseThrow();
    for (Jump jump : system.linear().jumps()) {
      if (jump.isSingular() && range.contains(jump.time())) {
        return new Part(
            JumpSelection.between(system.linear(), Double.NEGATIVE_INFINITY, jump.time()),
            new TimeRange(range.start(), jump.time()));
      }
    }
    return whole();
  }

  /** Says once for each statement that its jump cannot be undone. */
  private void singularJumps() {
    Set<Span> told = new HashSet<>();
    Map<Double, List<Jump>> byTime =
        system.linear().jumps().stream().collect(Collectors.groupingBy(Jump::time));
    for (org.spanloom.language.model.Jump statement : system.model().jumps()) {
      Set<Integer> rows =
          statement.changes().stream()
              .map(org.spanloom.language.model.Jump.Change::component)
              .collect(Collectors.toSet());
      for (double time : system.times(statement)) {
        for (Jump jump : byTime.getOrDefault(time, List.of())) {
          boolean own =
              rows.equals(jump.rows().stream().map(Jump.Row::row).collect(Collectors.toSet()));
          if (own && jump.isSingular() && told.add(statement.span())) {
            SequencedMap<String, Double> numbers = new LinkedHashMap<>();
            numbers.put("time", time);
            add(FindingKind.JUMP_SINGULAR, statement.timesSpan(), messages.lost(jump), numbers);
          }
        }
      }
    }
  }

  private void add(FindingKind kind, Span span, String message) {
    add(kind, span, message, new LinkedHashMap<>());
  }

  private void add(
      FindingKind kind, Span span, String message, SequencedMap<String, Double> numbers) {
    findings.add(kind.at(span, message, numbers));
  }

  /**
   * The basis that nobody asked for: a property of the system, worth knowing as long as it costs
   * little.
   */
  private void principal(double start) {
    if (system.dimension() > LARGEST_UNASKED) {
      add(
          FindingKind.BASIS_NOT_FOLLOWED,
          system.model().nameSpan(),
          messages.notFollowed(LARGEST_UNASKED));
    } else if (sound().range().length() > 0 || whole().range().length() == 0) {
      follow(BasisColumns.principal(system, start), sound(), system.model().nameSpan());
    }
  }

  private Judged columns(BasisColumns basis, Span span) {
    Optional<Judged.Unfit> unfit = unfit(basis, span);
    if (unfit.isPresent()) {
      return unfit.get();
    }
    if (solutions.range().isEmpty()) {
      return new Judged.Unfit("the interval is not bounded; add 'until TIME'");
    }
    return follow(basis, whole(), span);
  }

  private Judged follow(BasisColumns basis, Part part, Span span) {
    Outcome<Solution> outcome =
        basis.solve(
            system,
            part.linear(),
            part.range(),
            solutions.settings().basisAccuracy(),
            Optional.empty(),
            solutions.progress());
    return switch (outcome) {
      case Outcome.Solved<Solution> s ->
          profile(s.value(), basis.name(), basis.declared(), part, span);
      case Outcome.Cancelled<Solution> c -> new Judged.Unfit("the check was cancelled");
      case Outcome.Unsolved<Solution> u -> missing(u, span);
    };
  }

  private Judged missing(Outcome.Unsolved<?> unsolved, Span span) {
    String text = Refusals.text(system, unsolved);
    add(FindingKind.SOLUTION_MISSING, span, "No basis can be computed: " + text);
    return new Judged.Unfit(text);
  }

  /** Tests the columns at the one time where they are known. */
  private Optional<Judged.Unfit> unfit(BasisColumns basis, Span span) {
    Optional<Dependence> dependence =
        Dependence.among(basis.start(), system.dimension(), basis.columns());
    if (dependence.isPresent()) {
      String message = messages.dependent(basis.name(), dependence.get(), basis.startTime());
      add(FindingKind.BASIS_DEPENDENT, span, message);
      return Optional.of(new Judged.Unfit("the columns of " + basis.name() + " are dependent"));
    }
    return basis.columns() == system.dimension()
        ? Optional.empty()
        : Optional.of(new Judged.Unfit(basis.name() + " does not have as many columns as states"));
  }

  private Judged closedForm(Basis.ClosedForm basis) {
    if (solutions.range().isEmpty()) {
      return new Judged.Unfit("the interval is not bounded; add 'until TIME'");
    }
    TimeRange range = solutions.range().get();
    ClosedFormCandidate candidate = new ClosedFormCandidate(system, basis, range);
    switch (ClosedFormResidual.of(system.linear(), candidate, range, solutions.progress())) {
      case Outcome.Solved<ClosedFormResidual[]> s -> {
        if (isWrong(basis, s.value())) {
          return new Judged.Unfit(basis.name() + " does not solve the system");
        }
      }
      case Outcome.Cancelled<ClosedFormResidual[]> c -> {
        return new Judged.Unfit("the check was cancelled");
      }
      case Outcome.Unsolved<ClosedFormResidual[]> u -> {
        return missing(u, basis.nameSpan());
      }
    }
    double middle = range.start() + range.length() / 2;
    double[] x = new double[system.dimension() * basis.columns()];
    candidate.value(middle, x);
    BasisColumns columns =
        new BasisColumns(basis.name(), true, middle, basis.columns(), x, basis.span());
    Optional<Judged.Unfit> unfit = unfit(columns, basis.nameSpan());
    return unfit.isPresent()
        ? unfit.get()
        : profile(candidate, basis.name(), true, whole(), basis.nameSpan());
  }

  /**
   * Tells whether a column does not solve the system, and says so at the row of the component it
   * fails.
   */
  private boolean isWrong(Basis.ClosedForm basis, ClosedFormResidual[] residuals) {
    boolean wrong = false;
    for (ClosedFormResidual residual : residuals) {
      if (residual.relative() > solutions.settings().residualLimit()) {
        SequencedMap<String, Double> numbers = new LinkedHashMap<>();
        numbers.put("residual", residual.relative());
        numbers.put("limit", solutions.settings().residualLimit());
        numbers.put("column", residual.column() + 1.0);
        numbers.put("time", residual.time());
        add(
            FindingKind.BASIS_NOT_A_SOLUTION,
            basis.rowSpans().get(residual.component()),
            messages.notASolution(basis.name(), residual),
            numbers);
        wrong = true;
      }
    }
    return wrong;
  }

  private Judged profile(Solution solution, String name, boolean declared, Part part, Span span) {
    Outcome<ConditionProfile> outcome =
        ConditionProfile.of(part.linear(), solution, part.range(), solutions.progress());
    return switch (outcome) {
      case Outcome.Solved<ConditionProfile> s -> {
        judge(solution, s.value(), name, declared, part, span);
        yield new Judged.Fit(solution, s.value());
      }
      case Outcome.Cancelled<ConditionProfile> c -> new Judged.Unfit("the check was cancelled");
      case Outcome.Unsolved<ConditionProfile> u -> missing(u, span);
    };
  }

  private void judge(
      Solution solution,
      ConditionProfile profile,
      String name,
      boolean declared,
      Part part,
      Span span) {
    TimeRange range = part.range();
    BasisReport report = report(profile, name, declared, part, span);
    reports.add(report);
    TimeRange relied = declared ? relied(name, solution, range) : range;
    Digits digits = Digits.of(profile, relied, solution.startTime());
    double wanted = solutions.settings().digitsWanted(system.model().accuracy());
    SequencedMap<String, Double> numbers = numbers(report, digits);
    boolean tooFew = digits.fewest() < wanted;
    if (declared && digits.fewest() < solutions.settings().digitsLeast()) {
      add(FindingKind.BASIS_WITHOUT_DIGITS, span, messages.withoutDigits(report, digits), numbers);
    } else if (declared && tooFew) {
      add(
          FindingKind.BASIS_ILL_CONDITIONED,
          span,
          messages.illConditioned(report, digits, wanted),
          numbers);
    } else {
      Digits whole = Digits.of(profile, range, solution.startTime());
      if (whole.fewest() < wanted) {
        double from = report.fewerFrom().orElse(whole.time());
        add(
            FindingKind.BASIS_DEGENERATES,
            span,
            messages.degenerates(report, from, wanted),
            numbers(report, whole));
      }
    }
    liouville(profile, name, span);
  }

  /** The times at which the model relies on a declared basis. */
  private TimeRange relied(String name, Solution solution, TimeRange range) {
    Optional<Double> until = Optional.empty();
    for (Requirement requirement : system.model().requirements()) {
      if (requirement instanceof Requirement.Condition c && c.basis().equals(name)) {
        double end = c.until().map(system::time).orElse(range.end());
        until = Optional.of(Math.max(until.orElse(end), end));
      }
    }
    double end = until.orElse(range.end());
    return new TimeRange(
        range.start(), Math.clamp(end, Math.max(range.start(), solution.startTime()), range.end()));
  }

  private BasisReport report(
      ConditionProfile profile, String name, boolean declared, Part part, Span span) {
    TimeRange range = part.range();
    double limit = solutions.settings().windowCondition();
    OptionalInt windows =
        switch (Windows.count(
            part.linear(),
            range,
            system.accuracy(solutions.settings().basisAccuracy()),
            limit,
            solutions.progress())) {
          case Outcome.Solved<Integer> s -> OptionalInt.of(s.value());
          case Outcome.Cancelled<Integer> c -> OptionalInt.empty();
          case Outcome.Unsolved<Integer> u -> OptionalInt.empty();
        };
    double wanted = solutions.settings().digitsWanted(system.model().accuracy());
    ConditionSample raw = profile.worstRaw();
    ConditionSample scaled = profile.worstScaled();
    return new BasisReport(
        system.model().name(),
        name,
        declared,
        range,
        raw.raw(),
        raw.time(),
        scaled.scaled(),
        scaled.time(),
        Digits.of(profile, range, range.start()).fewest(),
        wanted,
        profile.firstDigitsBelow(wanted),
        windows,
        limit,
        span);
  }

  private static SequencedMap<String, Double> numbers(BasisReport report, Digits digits) {
    SequencedMap<String, Double> numbers = new LinkedHashMap<>();
    numbers.put("condition", report.worstRaw());
    numbers.put("conditionTime", report.worstRawTime());
    numbers.put("scaledCondition", report.worstScaled());
    numbers.put("scaledConditionTime", report.worstScaledTime());
    numbers.put("digitsLeft", digits.fewest());
    numbers.put("digitsLeftTime", digits.time());
    report.windows().ifPresent(w -> numbers.put("windows", (double) w));
    numbers.put("windowLimit", report.windowLimit());
    return numbers;
  }

  /**
   * Compares the determinant with Liouville's formula where the basis still resolves it: the
   * relative error of a determinant is at most about n times condition times error.
   */
  private void liouville(ConditionProfile profile, String name, Span span) {
    int n = system.dimension();
    for (ConditionSample sample : profile.samples()) {
      double expected = 10 * n * sample.scaled() * Math.max(sample.error(), 0x1p-52) + 1e-9;
      if (expected < 1e-2 && sample.liouvilleMismatch() > expected) {
        SequencedMap<String, Double> numbers = new LinkedHashMap<>();
        numbers.put("mismatch", sample.liouvilleMismatch());
        numbers.put("expected", expected);
        numbers.put("time", sample.time());
        add(FindingKind.LIOUVILLE_MISMATCH, span, messages.liouville(name, sample), numbers);
        return;
      }
    }
  }
}
