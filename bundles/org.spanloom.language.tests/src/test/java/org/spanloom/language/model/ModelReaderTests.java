/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.language.model.ModelListing.affine;
import static org.spanloom.language.model.ModelListing.read;
import static org.spanloom.language.model.ModelListing.system;
import static org.spanloom.language.model.ModelListing.text;
import static org.spanloom.language.model.ModelListing.texts;

import java.util.List;
import java.util.concurrent.CancellationException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.spanloom.language.files.ProjectFiles;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.text.SourceText;

class ModelReaderTests {

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "over t [h] from 0 to 48|0.0|false|48.0|false",
        "over t [h] after 0 before 48|0.0|true|48.0|true",
        "over t [h] from 90 [min] to 2 [d]|1.5|false|48.0|false",
        "over t from -1.5 to 2*pi|-1.5|false|6.283185307179586|false",
        "over t from 2|2.0|false|Infinity|true",
        "over t before 3|-Infinity|true|3.0|true",
        "over t|-Infinity|true|Infinity|true",
        "over t [h] from 0.1 [h] to 0.3|0.1|false|0.3|false"
      })
  void intervals(String over, double start, boolean startOpen, double end, boolean endOpen) {
    SystemModel system = read("system S " + over + " { state x; x' = 0 }").systems().getFirst();
    assertEquals(new TimeInterval(start, startOpen, end, endOpen), system.interval());
  }

  @Test
  void loneNumbersTakeTheDeclaredUnit() {
    SystemModel system =
        system(
            """
            system S over t [h] from 0 to 48 {
              parameter C [kJ/K] = 85
              parameter D [kJ/K] = -85 [J/K]
              parameter T [Cel] = 20 ± 0.5
              parameter g [W/K] = 2 ± 5 %
              parameter h [W/K] = 2 +/- 0.001 [kW/K]
              let area [cm2] = 3 [m2]
              let w = 2*6 [h]
              state x [km] = 2
              output total [kJ/K] = C + D
              output ratio = g/h
              output temperature [Cel] = T
              x' = area*w*1 [km/(m2.s2)]
            }
            """);
    assertEquals(
        List.of("85000", "-85", "293.15", "2", "2"),
        system.parameters().stream().map(p -> text(system, p.value())).toList());
    assertEquals(
        List.of("0.5", "0.1", "1"),
        system.parameters().stream()
            .flatMap(p -> p.uncertainty().stream())
            .map(u -> text(system, u))
            .toList());
    assertEquals(
        List.of("cm2 3", "s 43200"),
        system.lets().stream().map(l -> l.unit().code() + " " + text(system, l.value())).toList());
    assertEquals("2000", texts(system, system.initialValues().getFirst().values()));
  }

  @Test
  void derivativesHaveUnitsOfTheirOwn() {
    SystemModel system =
        system(
            """
            system S over t [h] from 0 to 1 {
              state T [Cel] = 4; state T' [K/h] = 2
              state x [mm] = 1; state x' [m/s] = 3 [mm/s] scale 0.5
              T'' = 0
              x'' = 0
            }
            """);
    assertEquals(
        List.of("T Cel 1.0", "T' K/h 1.0", "x mm 1.0", "x' m/s 0.5"),
        system.states().stream()
            .map(s -> s.label() + " " + s.unit().code() + " " + s.scale())
            .toList());
    assertEquals(
        "277.15, 5.555555555555556e-4, 0.001, 0.003",
        texts(system, system.initialValues().getFirst().values()));
    assertEquals(1.0 / 3600, system.states().get(1).unit().factor());
  }

  @Test
  void theUnitOfAnUndeclaredDerivativeIsTheStatesOverThatOfTime() {
    Model model =
        read(
            "system S over t [h] from 0 to 1 { state x [km]; x'' = 0; state y; y'' = 0; state T"
                + " [Cel]; T'' = 0 }");
    assertEquals(
        List.of("km", "km/h", "1", "/h", "Cel", "K/h"),
        model.systems().getFirst().states().stream().map(s -> s.unit().code()).toList());
  }

  @Test
  void initialValues() {
    SystemModel system =
        system(
            """
            system S over t [h] from 1 to 48 {
              parameter T0 [K] = 280
              state T [K] = T0 + 3 [K]
              state P [kW] = 0
              T' = 0
              P' = 0
              initial values warm { P = 1; T = 20 [Cel] }
              initial values late at 2*T0/280 [K]*1 [h] {
                T = 300
                P = 2 [W]
              }
            }
            """);
    assertEquals(
        List.of(" 3600: T0 + 3, 0", "warm 3600: 293.15, 1000", "late 2*T0/280*3600: 300, 2"),
        system.initialValues().stream()
            .map(v -> v.name() + " " + text(system, v.time()) + ": " + texts(system, v.values()))
            .toList());
  }

  @Test
  void bases() {
    SystemModel system =
        system(
            """
            system S over t [h] from 0 to 48 {
              parameter k [/h] = 2
              state x [km]; state v [km/h]
              x' = v
              v' = -k*v
              basis p at 1 [d]
              basis s at 0 =
                row v = 0, 2 [m/s]
                row x = 1, 2*500 [m]
              basis c(t) =
                row x = 1, exp(-k*t)*1 [km]
                row v = 0, -k*exp(-k*t)*1 [km]
            }
            """);
    Basis.Principal principal = assertInstanceOf(Basis.Principal.class, system.bases().get(0));
    assertEquals("86400", text(system, principal.time()));
    Basis.Given given = assertInstanceOf(Basis.Given.class, system.bases().get(1));
    assertEquals(2, given.columns());
    assertEquals("1, 1", texts(system, given.rows().get(0)));
    // 2 m/s are 7.2 km/h.
    assertEquals(0, TermEvaluator.constant(given.rows().get(1).get(0)));
    assertEquals(7.2, TermEvaluator.constant(given.rows().get(1).get(1)), 1e-14);
    Basis.ClosedForm closed = assertInstanceOf(Basis.ClosedForm.class, system.bases().get(2));
    assertEquals(Math.exp(-2), TermEvaluator.of(closed.rows().get(0).get(1)).at(3600), 1e-14);
    assertEquals(-2 * Math.exp(-2), TermEvaluator.of(closed.rows().get(1).get(1)).at(3600), 1e-14);
  }

  @Test
  void requirements() {
    SystemModel system =
        system(
            """
            system S over t [h] from 0 to 48 {
              state x [K] = 1; state x' [K/h] = 0
              x'' = -x/1 [h2]
              output q [mK] = 2*x + t*1 [K/h]
              basis p at 0
              initial values warm { x = 2; x' = 0 }
              require x(12 [h]) - x(before 6) < 278 [K] under warm
              require q(2) >= x'(0)*1 [h]
              require x < 300 [mK] throughout until 10 under warm
              require x*t/1 [h] > -4 [K] throughout
              require condition(p) < 1e6
              require scaled condition(p) <= 1e3 until 30 [min]
              require stable
              require nonnegative under warm
              require invariant 2*x + q
              require period 24
            }
            """);
    List<Requirement> all = system.requirements();
    Requirement.AtTime first = assertInstanceOf(Requirement.AtTime.class, all.get(0));
    assertEquals("(1) x(43200) + (-1) x(before 21600) + 0", affine(system, first.left()));
    assertEquals(Relation.LESS, first.relation());
    assertEquals("278", affine(system, first.right()).strip());
    assertEquals("warm", first.under());
    assertEquals("x(12 [h]) - x(before 6) < 278 [K] under warm", first.text());
    Requirement.AtTime second = assertInstanceOf(Requirement.AtTime.class, all.get(1));
    // An output at a named time: its own dependence on time is at that time, too.
    assertEquals(2 * 3600 * (1 / 3600.0), TermEvaluator.constant(second.left().constant()), 1e-12);
    assertEquals("(3600) x'(0) + 0", affine(system, second.right()));
    Requirement.Throughout third = assertInstanceOf(Requirement.Throughout.class, all.get(2));
    assertEquals("36000", text(system, third.until().orElseThrow()));
    assertEquals("mK", third.left().unit().code());
    assertInstanceOf(Requirement.Throughout.class, all.get(3));
    Requirement.Condition raw = assertInstanceOf(Requirement.Condition.class, all.get(4));
    assertFalse(raw.scaled());
    Requirement.Condition scaled = assertInstanceOf(Requirement.Condition.class, all.get(5));
    assertTrue(scaled.scaled());
    assertEquals("1800", text(system, scaled.until().orElseThrow()));
    assertInstanceOf(Requirement.Stable.class, all.get(6));
    assertInstanceOf(Requirement.Nonnegative.class, all.get(7));
    Requirement.Invariant invariant = assertInstanceOf(Requirement.Invariant.class, all.get(8));
    assertEquals("(4) x + t*2.777777777777778e-4", affine(system, invariant.value()));
    Requirement.Period period = assertInstanceOf(Requirement.Period.class, all.get(9));
    assertEquals("86400", text(system, period.period()));
  }

  @Test
  void topLevelNamesHoldInEverySystem() {
    Model model =
        read(
            """
            parameter k = 2
            let m = 3*k
            system A over t from 0 to 1 { state x = 1; x' = -k*x }
            system B over t from 0 to 1 { state x = 1; x' = -m*x }
            """);
    assertEquals(List.of(), model.problems());
    assertEquals("k", model.systems().get(0).parameters().getFirst().name());
    assertEquals("m", model.systems().get(1).lets().getFirst().name());
  }

  @Test
  void theOrderOfDeclarationsDoesNotMatter() {
    SystemModel system =
        system(
            "system S over t from 0 to 1 { x' = -c*x + q\n"
                + " output q = b*x\n"
                + " let c = a + b\n"
                + " let b = 2*a\n"
                + " parameter a = 1\n"
                + " state x = 1 }");
    assertEquals(List.of("c", "b"), system.lets().stream().map(Let::name).toList());
  }

  @Test
  void aSystemWithAnErrorIsNotSoundAndTheOthersAre() {
    Model model =
        read(
            """
            system A over t from 0 to 1 { state x = 1; x' = -k*x }
            system B over t from 0 to 1 { state x = 1; x' = -x }
            """);
    assertFalse(model.isSound(model.systems().get(0)));
    assertTrue(model.isSound(model.systems().get(1)));
    assertTrue(model.systems().get(0).equations().isEmpty());
  }

  @Test
  void problemsAreLimited() {
    StringBuilder text = new StringBuilder("system S over t from 0 to 1 { state x = 1; x' = 0\n");
    for (int i = 0; i < 5000; i++) {
      text.append("output o").append(i).append(" = foo").append(i).append("\n");
    }
    Model model = read(text.append("}").toString());
    assertEquals(1001, model.problems().size());
    assertEquals(ProblemKind.TOO_MANY_PROBLEMS, model.problems().getLast().kind());
    assertFalse(model.isSound(model.systems().getFirst()));
  }

  @Test
  void readingCanBeCancelled() {
    SourceText source = new SourceText("s", "system S over t from 0 to 1 { state x = 1; x' = 0 }");
    assertThrows(
        CancellationException.class,
        () -> ModelReader.read(source, ProjectFiles.none(), () -> true));
  }

  @Test
  void expressionsThatShareAllTheirPartsTakeNoLongTime() {
    StringBuilder text =
        new StringBuilder("system S over t from 0 to 1 { state x = 1\nlet a0 = 1\n");
    for (int i = 1; i < 300; i++) {
      text.append("let a" + i + " = (a" + (i - 1) + " + a" + (i - 1) + ")/2\n");
    }
    SystemModel system = system(text + "x' = a299*x\nrequire x(a299) < 2 }");
    assertEquals(
        1, TermEvaluator.constant(system.equations().orElseThrow().matrix().getFirst().term()));
  }

  @Test
  void chainsBeyondTheLimitAreAProblem() {
    StringBuilder text =
        new StringBuilder("system S over t from 0 to 1 { state x = 1\nlet a0 = 1\n");
    for (int i = 1; i < 5000; i++) {
      text.append("let a" + i + " = a" + (i - 1) + " + 1\n");
    }
    Model model = read(text + "x' = a4999*x }");
    assertEquals(
        List.of(ProblemKind.NESTING_TOO_DEEP),
        model.problems().stream().map(p -> p.kind()).distinct().toList());
    assertEquals(1, model.problems().size());
  }

  @Test
  void longSumsAndProductsAreNoProblem() {
    String sum = " + x/3".repeat(20_000);
    SystemModel system = system("system S over t from 0 to 1 { state x = 1\nx' = x" + sum + "\n}");
    double k = TermEvaluator.constant(system.equations().orElseThrow().matrix().getFirst().term());
    assertEquals(1 + 20_000 / 3.0, k, 1e-9);
    Model product =
        read("system S over t from 0 to 1 { state x = 1\nx' = x" + "*t".repeat(20_000) + "\n}");
    assertEquals(
        List.of(ProblemKind.NESTING_TOO_DEEP),
        product.problems().stream().map(p -> p.kind()).toList());
  }
}
