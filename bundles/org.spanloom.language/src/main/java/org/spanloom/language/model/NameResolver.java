/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.spanloom.language.model.Meaning.BoundInputMeaning;
import org.spanloom.language.model.Meaning.BrokenMeaning;
import org.spanloom.language.model.Meaning.FamilyMeaning;
import org.spanloom.language.model.Meaning.IndexMeaning;
import org.spanloom.language.model.Meaning.LetMeaning;
import org.spanloom.language.model.Meaning.MatrixMeaning;
import org.spanloom.language.model.Meaning.OutputMeaning;
import org.spanloom.language.model.Meaning.ParameterMeaning;
import org.spanloom.language.model.Meaning.PartMeaning;
import org.spanloom.language.model.Meaning.StateMeaning;
import org.spanloom.language.model.Meaning.TimeMeaning;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.Argument;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;
import org.spanloom.language.units.UnitOfMeasure;

/** Gives names and calls in expressions their meaning. */
final class NameResolver {

  private final Resolver resolver;
  private final Switching switching;
  private final Scope scope;
  private final Problems problems;
  private final MatrixNames matrices;

  NameResolver(Resolver resolver, Switching switching, Scope scope, Problems problems) {
    this.resolver = resolver;
    this.switching = switching;
    this.scope = scope;
    this.problems = problems;
    this.matrices = new MatrixNames(this, resolver, scope, problems);
  }

  boolean isStateOrOutput(NameExpression name) {
    return scope
        .own(name.name().text())
        .filter(m ->
            m instanceof StateMeaning
                || m instanceof FamilyMeaning
                || m instanceof OutputMeaning
                || m instanceof BoundInputMeaning)
        .isPresent();
  }

  /**
   * Returns what a reference means, of a member of a family the state; empty where nothing has that
   * name, and a broken meaning after a problem was reported.
   */
  Optional<Meaning> meaning(NameExpression name, Place place) {
    Optional<Meaning> meaning = scope.use(name.name().text());
    boolean family = meaning.isPresent() && meaning.get() instanceof FamilyMeaning;
    if (meaning.isEmpty()) {
      return builtInWithIndex(name) ? broken(name) : meaning;
    }
    if (family && !place.states()) {
      reportMisplacedState(name, place);
      return broken(name);
    }
    if (name.isIndexed() && meaning.get() instanceof MatrixMeaning matrix) {
      return entry(matrix, name);
    }
    if (name.isIndexed()) {
      return family
          ? member((FamilyMeaning) meaning.get(), name)
          : notIndexable(name, meaning.get());
    }
    return family ? bareFamily((FamilyMeaning) meaning.get(), name) : meaning;
  }

  private Optional<Meaning> member(FamilyMeaning family, NameExpression name) {
    Optional<StateMeaning> state = resolver.indices().member(family, name);
    return state.isPresent() ? Optional.of(state.get()) : broken(name);
  }

  /** Returns an entry of a matrix as a matrix of one row and one column. */
  private Optional<Meaning> entry(MatrixMeaning matrix, NameExpression name) {
    MatrixValue value = matrix.value();
    IndexSpace space =
        new IndexSpace(List.of(1L, 1L), List.of((long) value.rows(), (long) value.columns()));
    OptionalInt place = resolver.indices().place(space, name);
    if (place.isEmpty()) {
      return broken(name);
    }
    Quantity found =
        value.at(place.getAsInt() / value.columns(), place.getAsInt() % value.columns());
    return Optional.of(
        new MatrixMeaning(
            matrix.matrix(),
            new MatrixValue(1, 1, List.of(new MatrixValue.Entry(0, 0, found)), value.dimension())));
  }

  private static Optional<Meaning> broken(NameExpression name) {
    return Optional.of(new BrokenMeaning(name.span()));
  }

  private boolean builtInWithIndex(NameExpression name) {
    String word = name.name().text();
    boolean builtIn = NamedConstant.named(word).isPresent() || Function.named(word).isPresent();
    if (name.isIndexed() && builtIn) {
      reportIndex(name, "is built in");
    }
    return name.isIndexed() && builtIn;
  }

  private Optional<Meaning> notIndexable(NameExpression name, Meaning meaning) {
    if (!(meaning instanceof BrokenMeaning)) {
      reportIndex(name, "is " + meaning.kind());
    }
    return broken(name);
  }

  private void reportIndex(NameExpression name, String found) {
    Span index = new Span(name.name().span().end(), name.span().end() - name.primes());
    problems.report(
        ProblemKind.NAME_MISUSED,
        name.span(),
        "\""
            + resolver.shown(name.span())
            + "\": \""
            + name.name().text()
            + "\" "
            + found
            + ", not a family, and has no index; units stand behind numbers only: remove the"
            + " brackets.",
        Fix.replace("Remove the brackets", index, ""));
  }

  private Optional<Meaning> bareFamily(FamilyMeaning family, NameExpression name) {
    String word = name.name().text();
    String example = word + family.space().shown(0);
    List<String> indices = problems.indices().names();
    boolean fits = !indices.isEmpty() && indices.size() == family.space().rank();
    String index = "[" + String.join(", ", indices) + "]";
    problems.report(
        ProblemKind.NAME_MISUSED,
        name.span(),
        "\""
            + word
            + "\" is a family of states: name one of its members here, as in "
            + example
            + ".",
        fits
            ? new Fix[] {Fix.insert("Write " + word + index, name.name().span().end(), index)}
            : new Fix[0]);
    return broken(name);
  }

  /** Returns the family that a name without index stands for. */
  private Optional<FamilyMeaning> family(NameExpression name) {
    return name.isIndexed()
        ? Optional.empty()
        : scope
            .own(name.name().text())
            .filter(FamilyMeaning.class::isInstance)
            .map(FamilyMeaning.class::cast)
            .filter(family -> !family.members().isEmpty());
  }

  /** Reports a family without index where a single value belongs; tells whether there was one. */
  boolean refusesFamily(Expression expression) {
    Optional<NameExpression> name =
        expression instanceof NameExpression n ? Optional.of(n) : Optional.empty();
    Optional<FamilyMeaning> family = name.flatMap(this::family);
    family.ifPresent(f -> bareFamily(f, name.orElseThrow()));
    return family.isPresent();
  }

  /** Returns the value of a name without arguments. */
  Optional<? extends Value> name(NameExpression name, Place place) {
    Optional<FamilyMeaning> family = family(name).filter(f -> place.states());
    if (family.isPresent()) {
      scope.markUsed(name.name().text());
      return matrices.column(family.get(), name);
    }
    Optional<Meaning> meaning = meaning(name, place);
    if (meaning.isEmpty()) {
      return builtIn(name);
    }
    if (name.primes() > 0 && hasNoDerivative(name, meaning.get())) {
      return Optional.empty();
    }
    return switch (meaning.get()) {
      case TimeMeaning time -> time(time, name, place);
      case ParameterMeaning m -> Optional.of(parameter(m));
      case LetMeaning m when m.let().dependsOnTime() -> bareFunctionOfTime(name);
      case LetMeaning m -> Optional.of(let(m));
      case StateMeaning m -> state(m, name, place);
      case MatrixMeaning m when m.matrix().dependsOnTime() -> bareFunctionOfTime(name);
      case MatrixMeaning m -> matrices.value(m, name, place);
      case FamilyMeaning m -> Optional.empty();
      case IndexMeaning m ->
          Optional.of(Quantity.constant(new Term.Constant(m.value()), Dimension.NONE, 1));
      case OutputMeaning m -> output(m, name, place);
      case BoundInputMeaning m -> bareFunctionOfTime(name);
      case PartMeaning m -> barePart(name, m);
      case BrokenMeaning m -> Optional.empty();
    };
  }

  /** Returns the value of a name with arguments. */
  Optional<? extends Value> call(CallExpression call, Place place) {
    NameExpression callee = call.callee();
    Optional<Meaning> meaning = meaning(callee, place);
    if (meaning.isEmpty()) {
      return function(call, place);
    }
    if (callee.primes() > 0 && hasNoDerivative(callee, meaning.get())) {
      return Optional.empty();
    }
    return switch (meaning.get()) {
      case TimeMeaning m -> notCallable(call, m);
      case ParameterMeaning m -> notCallable(call, m);
      case LetMeaning m when m.let().dependsOnTime() ->
          isFunctionOfTime(call, place) ? Optional.of(let(m)) : Optional.empty();
      case IndexMeaning m -> notCallable(call, m);
      case FamilyMeaning m -> Optional.empty();
      case LetMeaning m -> notCallable(call, m);
      case MatrixMeaning m when m.matrix().dependsOnTime() ->
          isFunctionOfTime(call, place) ? matrices.value(m, callee, place) : Optional.empty();
      case MatrixMeaning m -> notCallable(call, m);
      case StateMeaning m ->
          isRunningTime(call) ? state(m, callee, place) : sampledState(m, call, place);
      case OutputMeaning m ->
          isRunningTime(call) ? output(m, callee, place) : sampledOutput(m, call, place);
      case BoundInputMeaning m ->
          isFunctionOfTime(call, place) ? boundInput(m, callee, place) : Optional.empty();
      case PartMeaning m -> barePart(callee, m);
      case BrokenMeaning m -> Optional.empty();
    };
  }

  private Optional<Quantity> builtIn(NameExpression name) {
    String word = name.name().text();
    Optional<NamedConstant> constant = NamedConstant.named(word);
    if (constant.isPresent() && name.primes() == 0) {
      return Optional.of(
          Quantity.constant(new Term.Constant(constant.get().value()), Dimension.NONE, 1));
    }
    if (Function.named(word).isPresent()
        || MatrixFunction.named(word).isPresent()
        || word.equals(PulseTrain.NAME)) {
      problems.report(
          ProblemKind.NAME_MISUSED,
          name.span(),
          "\"" + word + "\" is a function: write its argument in parentheses behind it.");
    } else {
      unknown(name);
    }
    return Optional.empty();
  }

  void unknown(NameExpression name) {
    String word = name.name().text();
    if (scope.isOpen()) {
      return;
    }
    Optional<String> nearest = problems.maySuggest() ? scope.nearest(word) : Optional.empty();
    nearest.ifPresent(scope::markUsed);
    problems.report(
        ProblemKind.NAME_UNKNOWN,
        name.name().span(),
        "\""
            + Quotes.shortened(word)
            + "\" is not declared: "
            + nearest
                .map(n -> "did you mean " + n + "?")
                .orElse(
                    word.indexOf('.') < 0
                        ? "declare it as a parameter, a named expression or a state."
                        : "name a part and, behind the point, something that it declares."),
        nearest.stream()
            .map(n -> Fix.replace("Write " + n, name.name().span(), n))
            .toArray(Fix[]::new));
  }

  private boolean hasNoDerivative(NameExpression name, Meaning meaning) {
    boolean matrix = meaning instanceof MatrixMeaning m && m.value().holdsStates();
    if (meaning instanceof StateMeaning || matrix || meaning instanceof BrokenMeaning) {
      return false;
    }
    problems.report(
        ProblemKind.NAME_MISUSED,
        name.span(),
        "\""
            + name.label()
            + "\": primes count derivatives of states, and \""
            + name.name().text()
            + "\" is "
            + meaning.kind()
            + ": remove the primes.");
    return true;
  }

  private Optional<Quantity> time(TimeMeaning time, NameExpression name, Place place) {
    if (!place.time()) {
      reportTime("\"" + name.name().text() + "\" is the independent variable", name.span(), place);
      return Optional.empty();
    }
    return Optional.of(Quantity.constant(new Term.Time(), time.unit().dimension(), 1));
  }

  private void reportTime(String found, Span span, Place place) {
    problems.report(
        ProblemKind.TIME_MISPLACED,
        span,
        found
            + " and cannot stand in "
            + place.what()
            + (place == Place.LET
                ? " without an argument: write let f(" + timeName() + ") for a function of it."
                : ", which is constant: use numbers and parameters only."));
  }

  private static Quantity parameter(ParameterMeaning meaning) {
    return Quantity.constant(
        new Term.ParameterTerm(meaning.parameter()),
        meaning.parameter().unit().dimension(),
        meaning.depth() + 1);
  }

  private static Quantity let(LetMeaning meaning) {
    return Quantity.constant(
        new Term.LetTerm(meaning.let()), meaning.let().unit().dimension(), meaning.depth() + 1);
  }

  private Optional<Quantity> bareFunctionOfTime(NameExpression name) {
    String time = timeName();
    problems.report(
        ProblemKind.NAME_MISUSED,
        name.span(),
        "\""
            + name.name().text()
            + "\" is a function of "
            + time
            + ": write "
            + name.name().text()
            + "("
            + time
            + ").",
        Fix.insert("Insert (" + time + ")", name.span().end(), "(" + time + ")"));
    return Optional.empty();
  }

  /** Tells whether a function of time is called at the running time where that is known. */
  private boolean isFunctionOfTime(CallExpression call, Place place) {
    if (!isRunningTime(call)) {
      String name = call.callee().name().text();
      problems.report(
          ProblemKind.NAME_MISUSED,
          call.span(),
          "\""
              + name
              + "\" is known at the running time only: write "
              + name
              + "("
              + timeName()
              + ").");
      return false;
    }
    scope.markUsed(timeName());
    if (!place.time()) {
      reportTime(
          "\"" + resolver.shown(call.span()) + "\" depends on " + timeName(), call.span(), place);
      return false;
    }
    return true;
  }

  private Optional<Quantity> state(StateMeaning state, NameExpression name, Place place) {
    if (!place.states()) {
      reportMisplacedState(name, place);
      return Optional.empty();
    }
    return hasKnownUnit(name)
        ? Optional.of(
            Quantity.state(StateKey.running(state.index(), name.primes()), dimension(state, name)))
        : Optional.empty();
  }

  private void reportMisplacedState(NameExpression name, Place place) {
    problems.report(
        ProblemKind.STATE_MISPLACED,
        name.span(),
        "The state \""
            + resolver.shown(name.span())
            + "\" cannot stand in "
            + place.what()
            + ": only numbers and parameters can"
            + (place.time() ? ", and functions of time." : ".")
            + (place.what().startsWith("a named expression")
                ? " Declare it as an output instead."
                : ""));
  }

  /** A derivative has no known unit where that of time could not be read. */
  private boolean hasKnownUnit(NameExpression name) {
    return name.primes() == 0 || !scope.timeName().isEmpty();
  }

  private Dimension dimension(StateMeaning state, NameExpression name) {
    return over(state.unit().dimension(), name.primes());
  }

  /** Returns the dimension of a derivative. */
  Dimension over(Dimension dimension, int primes) {
    Dimension time =
        scope.own(timeName()).map(NameResolver::dimensionOfTime).orElse(Dimension.NONE);
    return dimension.over(time.power(Math.min(primes, StateVector.ORDER_LIMIT)));
  }

  private static Dimension dimensionOfTime(Meaning meaning) {
    return meaning instanceof TimeMeaning time ? time.unit().dimension() : Dimension.NONE;
  }

  private Optional<Quantity> boundInput(BoundInputMeaning input, NameExpression name, Place place) {
    if (!place.states()) {
      problems.report(
          ProblemKind.STATE_MISPLACED,
          name.span(),
          "The input \""
              + name.label()
              + "\" is bound to states here and cannot stand in "
              + place.what()
              + ": declare what uses it as an output, or bind the input to a function of time.");
      return Optional.empty();
    }
    return Optional.of(input.value().inherited());
  }

  private Optional<Quantity> barePart(NameExpression name, PartMeaning part) {
    String label = name.name().text();
    String example =
        part.frame().scope().firstState().map(state -> ", as in " + label + "." + state).orElse("");
    problems.report(
        ProblemKind.NAME_MISUSED,
        name.span(),
        "\"" + label + "\" is a part and has no value: name something in it" + example + ".");
    return Optional.empty();
  }

  private Optional<Quantity> output(OutputMeaning output, NameExpression name, Place place) {
    if (!place.states()) {
      problems.report(
          ProblemKind.STATE_MISPLACED,
          name.span(),
          "The output \""
              + name.label()
              + "\" depends on states and cannot stand in "
              + place.what()
              + ".");
      return Optional.empty();
    }
    return Optional.of(output.value().inherited());
  }

  private Optional<Quantity> sampledState(StateMeaning state, CallExpression call, Place place) {
    return namedTime(call, place)
        .filter(at -> hasKnownUnit(call.callee()))
        .map(at -> {
          StateKey key =
              new StateKey(
                  state.index(),
                  call.callee().primes(),
                  Optional.of(at),
                  call.arguments().getFirst().before());
          return Quantity.state(key, dimension(state, call.callee()));
        });
  }

  private Optional<Quantity> sampledOutput(OutputMeaning output, CallExpression call, Place place) {
    boolean before = call.arguments().size() == 1 && call.arguments().getFirst().before();
    return namedTime(call, place).map(at -> TimeSubstitution.of(output.value(), at, before));
  }

  /** Returns the one time in the parentheses behind a state or output. */
  private Optional<Term> namedTime(CallExpression call, Place place) {
    String label = resolver.shown(call.callee().span());
    if (call.arguments().size() != 1 || call.arguments().getFirst().label().isPresent()) {
      problems.report(
          ProblemKind.ARGUMENT_COUNT,
          call.span(),
          "\"" + label + "\" takes one time in its parentheses, as in " + label + "(2).");
      return Optional.empty();
    }
    Expression time = call.arguments().getFirst().value();
    if (!place.samples()) {
      boolean delayed =
          ExpressionNames.of(time).stream().anyMatch(n -> n.name().text().equals(timeName()));
      problems.report(
          delayed ? ProblemKind.STATE_DELAYED : ProblemKind.STATE_MISPLACED,
          call.span(),
          delayed
              ? "\""
                  + resolver.shown(call.span())
                  + "\" is a state at another time than the running one: that is a delay equation,"
                  + " not an ordinary differential equation. Write "
                  + label
                  + ", or model the delay by states of its own."
              : "\""
                  + resolver.shown(call.span())
                  + "\" is a value at a fixed time and cannot stand in "
                  + place.what()
                  + ": write "
                  + label
                  + (place == Place.JUMP
                      ? " for the value just before it."
                      : " for the value at the running time."));
      return Optional.empty();
    }
    UnitOfMeasure unit =
        scope
            .own(timeName())
            .filter(TimeMeaning.class::isInstance)
            .map(m -> ((TimeMeaning) m).unit())
            .orElse(UnitOfMeasure.ONE);
    return resolver
        .given(time, unit, "the independent variable", Place.NAMED_TIME)
        .map(q -> q.constant().term());
  }

  private Optional<? extends Value> function(CallExpression call, Place place) {
    if (call.callee().label().equals(PulseTrain.NAME)) {
      return switching.pulse(call, place);
    }
    NameExpression callee = call.callee();
    String word = callee.name().text();
    if (MatrixFunction.named(word).isPresent() && callee.primes() == 0) {
      return takesArguments(call, 1) ? matrices.transposed(call, place) : Optional.empty();
    }
    Optional<Function> named = Function.named(word);
    if (named.isEmpty() || callee.primes() > 0) {
      reportNoFunction(call);
      return Optional.empty();
    }
    Function function = named.get();
    if (!takesArguments(call, function.arity())) {
      return Optional.empty();
    }
    List<Term> terms = new ArrayList<>();
    List<Dimension> dimensions = new ArrayList<>();
    int depth = 0;
    boolean sound = true;
    for (Argument argument : call.arguments()) {
      Optional<Quantity> value = resolver.quantity(argument.value(), place);
      if (value.isPresent() && value.get().holdsStates()) {
        sound =
            resolver.notLinear(
                call.span(),
                "in the argument of " + word + ", " + resolver.holding(argument.value()));
      } else if (value.isPresent()) {
        terms.add(value.get().constant().term());
        dimensions.add(value.get().dimension());
        depth = Math.max(depth, value.get().depth());
      }
    }
    if (!sound || terms.size() != function.arity()) {
      return Optional.empty();
    }
    Optional<Dimension> dimension = function.dimension(dimensions);
    if (dimension.isEmpty()) {
      reportDimensions(call, function, dimensions);
      return Optional.empty();
    }
    return Optional.of(
        Quantity.constant(Simplifier.call(function, terms), dimension.get(), depth + 1));
  }

  /** Tells whether a call has as many plain arguments as its function; reports it if not. */
  private boolean takesArguments(CallExpression call, int arity) {
    boolean labelled = call.arguments().stream().anyMatch(a -> a.label().isPresent() || a.before());
    if (call.arguments().size() == arity && !labelled) {
      return true;
    }
    useAll(call);
    problems.report(
        ProblemKind.ARGUMENT_COUNT,
        call.span(),
        "\""
            + call.callee().name().text()
            + "\" takes "
            + (arity == 1 ? "one argument" : arity + " arguments")
            + (labelled ? " without a name" : ", not " + call.arguments().size())
            + ".");
    return false;
  }

  private void reportDimensions(CallExpression call, Function function, List<Dimension> found) {
    Span span = call.arguments().getFirst().span();
    String reason =
        switch (function.dimensionRule()) {
          case PURE -> "needs a pure number: divide by a value of the same dimension";
          case HALVED -> "needs a value whose unit is a square: check the factors";
          case KEPT, DROPPED ->
              "needs values of one dimension, and \""
                  + resolver.shown(call.arguments().getLast().span())
                  + "\" is "
                  + Resolver.in(found.getLast())
                  + ": check the factors";
        };
    problems.report(
        ProblemKind.UNIT_MISMATCH,
        span,
        "\""
            + resolver.shown(span)
            + "\" is "
            + Resolver.in(found.getFirst())
            + ", but "
            + function.code()
            + " "
            + reason
            + ".");
  }

  /** What stands in a call without a meaning is not unused for that. */
  private void useAll(CallExpression call) {
    ExpressionNames.of(call).forEach(name -> scope.markUsed(name.name().text()));
  }

  private void reportNoFunction(CallExpression call) {
    NameExpression callee = call.callee();
    useAll(call);
    String word = callee.name().text();
    if (NamedConstant.named(word).isPresent() || Function.named(word).isPresent()) {
      problems.report(
          ProblemKind.NAME_MISUSED,
          callee.span(),
          "\""
              + callee.label()
              + "\" cannot be called: write * for a product, and no primes on functions.");
    } else {
      unknown(callee);
    }
  }

  private Optional<Quantity> notCallable(CallExpression call, Meaning meaning) {
    String name = call.callee().name().text();
    if (call.arguments().size() == 1 && isRunningTime(call)) {
      problems.report(
          ProblemKind.NAME_MISUSED,
          call.span(),
          "\""
              + name
              + "\" is "
              + meaning.kind()
              + " that does not depend on time: write "
              + name
              + ".",
          Fix.replace("Write " + name, call.span(), name));
    } else {
      problems.report(
          ProblemKind.NAME_MISUSED,
          call.span(),
          "\"" + name + "\" is " + meaning.kind() + ", not a function: write * for a product.",
          Fix.insert("Insert *", call.callee().span().end(), "*"));
    }
    return Optional.empty();
  }

  private boolean isRunningTime(CallExpression call) {
    return call.arguments().size() == 1
        && !call.arguments().getFirst().before()
        && call.arguments().getFirst().label().isEmpty()
        && call.arguments().getFirst().value() instanceof NameExpression argument
        && argument.primes() == 0
        && argument.name().text().equals(timeName());
  }

  private String timeName() {
    return scope.timeName();
  }
}
