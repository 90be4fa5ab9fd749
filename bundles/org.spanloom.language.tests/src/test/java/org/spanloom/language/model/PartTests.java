/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.language.model.ModelListing.equations;
import static org.spanloom.language.model.ModelListing.system;

import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.TextFiles;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.text.SourceText;

class PartTests {

  private static final String TANK =
      """
      system Tank over tau [min] from 0 to 90 {
        parameter area [m2] = 3
        parameter draw [1/h] = 0.1
        input supply(tau) [m3/h] = 0.5 [m3/h]*sin(tau/20 [min])
        let calm(tau) = exp(-tau/60 [min])
        state level [m] = 1
        output flow [m3/h] = draw*area*level
        area*level' = supply(tau) - calm(tau)*flow
      }
      """;

  private static Model read(String text, Map<String, String> others) {
    return ModelReader.read(
        new SourceText("main.span", text), new TextFiles("main.span", others), () -> false);
  }

  private static SystemModel sound(Model model, String name) {
    assertEquals(
        List.of(), model.problems().stream().map(p -> p.kind().id() + " " + p.message()).toList());
    return model.systems().stream().filter(s -> s.name().equals(name)).findFirst().orElseThrow();
  }

  /** Values of M, K and f at one time, by labels; dots of names are written as underscores. */
  private static Set<String> numbers(SystemModel system, double seconds) {
    Set<String> numbers = new TreeSet<>();
    LinearForm form = system.equations().orElseThrow();
    form.mass().forEach(e -> numbers.add("M" + entry(system, e, seconds)));
    form.matrix().forEach(e -> numbers.add("K" + entry(system, e, seconds)));
    form.forcing()
        .forEach(e ->
            numbers.add(
                "f "
                    + label(system, e.row())
                    + " "
                    + TermEvaluator.of(e.term(), Map.of()).at(seconds)));
    return numbers;
  }

  private static String entry(SystemModel system, LinearForm.MatrixEntry entry, double seconds) {
    return " "
        + label(system, entry.row())
        + " "
        + label(system, entry.column())
        + " "
        + TermEvaluator.of(entry.term(), Map.of()).at(seconds);
  }

  private static String label(SystemModel system, int index) {
    return system.states().get(index).label().replace('.', '_');
  }

  @Test
  void partsMeanWhatTheWrittenOutSystemMeans() {
    SystemModel parts =
        sound(
            read(
                TANK
                    + """
                    system Two over t [h] from 0 to 24 {
                      parameter wide [m2] = 4
                      part hill = Tank { area = 2*wide; level = 2 }
                      part house = Tank { supply = hill.flow + 0.1 [m3/h]; draw = 0.3 }
                      state drained [m3] = 0
                      drained' = house.flow
                    }
                    """,
                Map.of()),
            "Two");
    SystemModel flat =
        sound(
            read(
                """
                system Two over t [h] from 0 to 24 {
                  parameter wide [m2] = 4
                  parameter area_hill [m2] = 2*wide
                  parameter draw_hill [1/h] = 0.1
                  parameter area_house [m2] = 3
                  parameter draw_house [1/h] = 0.3
                  let calm(t) = exp(-t/60 [min])
                  let supply(t) [m3/h] = 0.5 [m3/h]*sin(t/20 [min])
                  state hill_level [m] = 2
                  output hill_flow [m3/h] = draw_hill*area_hill*hill_level
                  area_hill*hill_level' = supply(t) - calm(t)*hill_flow
                  state house_level [m] = 1
                  output house_flow [m3/h] = draw_house*area_house*house_level
                  area_house*house_level' = hill_flow + 0.1 [m3/h] - calm(t)*house_flow
                  state drained [m3] = 0
                  drained' = house_flow
                }
                """,
                Map.of()),
            "Two");
    assertEquals(numbers(flat, 1234.5), numbers(parts, 1234.5));
    assertEquals(
        flat.initialValues().getFirst().values().stream().map(TermEvaluator::constant).toList(),
        parts.initialValues().getFirst().values().stream().map(TermEvaluator::constant).toList());
    assertEquals(
        List.of("hill.level", "house.level", "drained"),
        parts.states().stream().map(StateComponent::label).toList());
    assertEquals(
        List.of("wide", "hill.area", "hill.draw", "house.area", "house.draw"),
        parts.parameters().stream().map(Parameter::name).toList());
    assertEquals(
        List.of("hill.flow", "house.flow"), parts.outputs().stream().map(Output::name).toList());
  }

  @Test
  void everythingOfAPartLeadsBackToItsStatement() {
    String text =
        TANK
            + """
            system One over t [h] from 0 to 24 {
              part hill = Tank {
                area = 4
              }
            }
            """;
    SystemModel one = sound(read(text, Map.of()), "One");
    SourceText source = new SourceText("main.span", text);
    one.equations()
        .orElseThrow()
        .matrix()
        .forEach(e -> assertEquals("part hill = Tank", source.slice(e.sources().getFirst())));
    assertEquals("part hill = Tank", source.slice(one.states().getFirst().declaration()));
    one.parameters().forEach(p -> assertEquals("part hill = Tank", source.slice(p.span())));
  }

  @Test
  void partsOfSecondOrderHaveDerivatives() {
    SystemModel system =
        sound(
            read(
                """
                system Mass over t [s] from 0 to 10 {
                  parameter m [kg] = 2
                  input F(t) [N] = 0
                  state x [m] = 0
                  state x' [m/s] = 0
                  m*x'' = F(t)
                }
                system Coupled over t [s] from 0 to 10 {
                  parameter k [N/m] = 5
                  parameter d [N.s/m] = 3
                  part left  = Mass { F = k*(right.x - left.x) + d*(right.x' - left.x'); x' = 0.5 }
                  part right = Mass { F = -left.F(t); x = 0.1 }
                }
                """,
                Map.of()),
            "Coupled");
    assertEquals(
        List.of("left.x", "left.x'", "right.x", "right.x'"),
        system.states().stream().map(StateComponent::label).toList());
    assertEquals(
        List.of(0.0, 0.5, 0.1, 0.0),
        system.initialValues().getFirst().values().stream().map(TermEvaluator::constant).toList());
    assertTrue(equations(system).contains("K[right.x', left.x'] = d"), equations(system));
  }

  @Test
  void transfersLeadFromPartToPart() {
    SystemModel system =
        sound(
            read(
                """
                system Barrel over t [h] from 0 to 9 {
                  state oil [L] = 10
                  transfer oil -> outside = 0.1 [1/h]*oil
                }
                system Pair over t [h] from 0 to 9 {
                  part upper = Barrel
                  part lower = Barrel
                  transfer upper.oil -> lower.oil = 2 [1/h]*upper.oil
                }
                """,
                Map.of()),
            "Pair");
    assertTrue(numbers(system, 0).contains("K lower_oil upper_oil " + 2 / 3600.0));
    double all = 0.1 / 3600 + 2 / 3600.0;
    assertTrue(
        numbers(system, 0).contains("K upper_oil upper_oil " + -all),
        numbers(system, 0).toString());
  }

  @Test
  void jumpsOfAPartTakePlaceInItsOwnUnitOfTime() {
    SystemModel system =
        sound(
            read(
                """
                system Cup over t [min] from 0 to 90 {
                  parameter sip [mL] = 20
                  state tea [mL] = 200
                  tea' = -1 [mL/min]
                  jump every 30 from 30 to 90 { tea becomes tea - sip }
                }
                system Table over t [h] from 0 to 2 {
                  part mine = Cup { sip = 5 [mL] }
                  state pot [mL] = 900
                  pot' = 0 [mL/h]
                  jump at 1 { mine.tea becomes mine.tea + 30 [mL]; pot becomes pot - 30 [mL] }
                }
                """,
                Map.of()),
            "Table");
    Jump own = system.jumps().getFirst();
    Jump sips = system.jumps().getLast();
    assertEquals(
        List.of(1.0),
        Arrays.stream(own.times().times(system.timeUnit(), Map.of())).boxed().toList());
    assertEquals(
        List.of(0.5, 1.0, 1.5),
        Arrays.stream(sips.times().times(system.timeUnit(), Map.of())).boxed().toList());
    assertEquals(
        -5e-6, TermEvaluator.constant(sips.changes().getFirst().value().constant()), 1e-20);
    assertEquals(List.of(0, 1), own.changes().stream().map(Jump.Change::component).toList());
  }

  @Test
  void aFamilyInAPartMeansTheFamilyWrittenOut() {
    String chain =
        """
        system Chain over t [min] from 0 to 240 {
          parameter n = 3
          parameter k [/h] = 0.5
          input fed(t) [g/h] = 0.5
          state c[1..n] [g] = 4
          output out [g/h] = k*c[n]
          c[1]' = fed(t) - k*c[1]
          for i from 2 to n { c[i]' = k*(c[i-1] - c[i]) }
        }
        """;
    SystemModel parts =
        sound(
            read(
                chain
                    + """
                    system Two over t [h] from 0 to 4 {
                      part upper = Chain { c = 6 }
                      part lower = Chain { fed = upper.out; k = 0.25 [/h] }
                      output held [g] = sum over i from 1 to 3 of (upper.c[i] + lower.c[i])
                      initial values other { upper.c = 1; for i from 1 to 3 { lower.c[i] = i*1 [g] } }
                      require lower.c[2] < 10 [g] throughout
                    }
                    """,
                Map.of()),
            "Two");
    SystemModel flat =
        sound(
            read(
                """
                system Two over t [h] from 0 to 4 {
                  parameter k [/h] = 0.5
                  parameter l [/h] = 0.25
                  state u[1..3] [g] = 6
                  state v[1..3] [g] = 4
                  u[1]' = 0.5 [g/h] - k*u[1]
                  for i from 2 to 3 { u[i]' = k*(u[i-1] - u[i]) }
                  v[1]' = k*u[3] - l*v[1]
                  for i from 2 to 3 { v[i]' = l*(v[i-1] - v[i]) }
                  initial values other { u = 1; for i from 1 to 3 { v[i] = i*1 [g] } }
                }
                """,
                Map.of()),
            "Two");
    assertEquals(
        numbers(flat, 600).stream()
            .map(n -> n.replace("u[", "upper_c[").replace("v[", "lower_c["))
            .collect(Collectors.toCollection(TreeSet::new)),
        new TreeSet<>(numbers(parts, 600)));
    for (int set = 0; set < 2; set++) {
      assertEquals(values(flat, set), values(parts, set));
    }
    // In kilograms.
    assertEquals(List.of(0.006, 0.006, 0.006, 0.004, 0.004, 0.004), values(parts, 0));
    assertEquals("lower.c[2]", parts.states().get(4).label());
  }

  private static List<Double> values(SystemModel system, int set) {
    return system.initialValues().get(set).values().stream().map(TermEvaluator::constant).toList();
  }

  @Test
  void partsStandInPartsUnderDottedNames() {
    SystemModel system =
        sound(
            read(
                """
                system Cell over t from 0 to 1 { parameter a = 2; state x = 1; x' = -a*x }
                system Row over t from 0 to 1 {
                  parameter a = 3
                  part one = Cell { a = 2*a }
                  part two = Cell { x = 5 }
                }
                system Block over t from 0 to 1 {
                  part upper = Row { a = 7 }
                  part lower = Row
                  state sum = 0
                  sum' = upper.one.x + lower.two.x*lower.one.a
                  initial values all { upper.one.x = 1; upper.two.x = 2; lower.one.x = 3
                    lower.two.x = 4; sum = 0 }
                }
                """,
                Map.of()),
            "Block");
    assertTrue(numbers(system, 0).contains("K upper_one_x upper_one_x -14.0"));
    assertTrue(numbers(system, 0).contains("K lower_one_x lower_one_x -6.0"));
    assertTrue(numbers(system, 0).contains("K sum lower_two_x 6.0"));
    assertEquals(
        List.of(1.0, 5.0, 1.0, 5.0, 0.0),
        system.initialValues().getFirst().values().stream().map(TermEvaluator::constant).toList());
    assertEquals(2, system.initialValues().size());
  }

  @Test
  void onlyDynamicsOfAPartCount() {
    SystemModel system =
        sound(
            read(
                """
                system Cell over t from 0 to 1 {
                  state x = 1
                  x' = -x
                  accuracy 1e-3
                  basis p at 0
                  initial values other { x = 3 }
                  require x < 2 throughout
                }
                system Around over t from 0 to 9 { part c = Cell }
                """,
                Map.of()),
            "Around");
    assertEquals(List.of(), system.requirements());
    assertEquals(List.of(), system.bases());
    assertEquals(SystemModel.DEFAULT_ACCURACY, system.accuracy());
    assertEquals(1, system.initialValues().size());
    assertEquals(9, system.interval().end());
  }

  @Test
  void declarationsOfPartsMayNeedEachOther() {
    Model circle =
        read(
            """
            system Gain over t from 0 to 1 {
              input u(t) = 1
              state x = 1
              output y = x + u(t)
              x' = -x
            }
            system Loop over t from 0 to 1 {
              part a = Gain { u = b.y }
              part b = Gain { u = a.y }
            }
            """,
            Map.of());
    assertEquals(
        List.of(ProblemKind.NAME_CYCLE), circle.problems().stream().map(p -> p.kind()).toList());
    assertTrue(
        circle.problems().getFirst().message().contains("a.u -> b.y -> b.u -> a.y -> a.u"),
        circle.problems().getFirst().message());
  }

  @Test
  void anImportBringsWhatAFileDeclaresAndNotWhatItImports() {
    Map<String, String> files =
        Map.of(
            "lib/tank.span",
            "import \"oil.span\"\n" + TANK + "parameter margin = 2*thick\n",
            "lib/oil.span",
            "parameter thick = 4\nlet calm = thick/2\n");
    Model model =
        read(
            """
            import "lib/tank.span"
            system One over t [h] from 0 to 24 {
              part hill = Tank { area = margin*1 [m2] }
              output twice [m] = margin*hill.level
            }
            """,
            files);
    SystemModel one = sound(model, "One");
    assertEquals(List.of(new FileKey("lib/tank.span"), new FileKey("lib/oil.span")), model.files());
    assertTrue(one.parameters().stream().anyMatch(p -> p.name().equals("margin")));
    assertTrue(one.parameters().stream().anyMatch(p -> p.name().equals("lib/oil.thick")));
    assertTrue(numbers(one, 0).contains("M hill_level hill_level 8.0"), numbers(one, 0).toString());
    Model hidden =
        read(
            """
            import "lib/tank.span"
            system One over t [h] from 0 to 24 { state x = thick; x' = -x/1 [h] }
            """,
            files);
    assertEquals(
        List.of(ProblemKind.NAME_UNKNOWN), hidden.problems().stream().map(p -> p.kind()).toList());
  }

  @Test
  void twoWaysToOneFileAreNoCircle() {
    Model model =
        read(
            "import \"a.span\"\nimport \"b.span\"\nsystem S over t from 0 to 1 { state x = va; x' ="
                + " -vb*x }\n",
            Map.of(
                "a.span", "import \"c.span\"\nparameter va = vc\n",
                "b.span", "import \"c.span\"\nparameter vb = vc\n",
                "c.span", "parameter vc = 2\n"));
    assertEquals(
        "-2.0", numbers(sound(model, "S"), 0).toString().replaceAll(".*K x x ([^,\\]]*).*", "$1"));
  }

  @Test
  void aChainOfImportsIsBounded() {
    Map<String, String> files = new HashMap<>();
    for (int i = 0; i < 200; i++) {
      files.put("f" + i + ".span", "import \"f" + (i + 1) + ".span\"\n");
    }
    Model model = read("import \"f0.span\"\n", files);
    assertEquals(1, model.problems().size());
    assertTrue(
        model.problems().getFirst().message().contains("a chain of more than 50"),
        model.problems().getFirst().message());
  }

  @Test
  void partsThatDoubleAreBounded() {
    StringBuilder text =
        new StringBuilder("system S0 over t from 0 to 1 { state x = 1; x' = -x }\n");
    for (int i = 1; i <= 40; i++) {
      text.append("system S").append(i).append(" over t from 0 to 1 { ");
      text.append("part a = S").append(i - 1).append("; part b = S").append(i - 1).append(" }\n");
    }
    Model model = read(text.toString(), Map.of());
    assertEquals(
        List.of(ProblemKind.PARTS_TOO_MANY),
        model.problems().stream().map(p -> p.kind()).distinct().toList());
    assertFalse(model.isSound(model.systems().getLast()));
    assertTrue(model.isSound(model.systems().get(5)));
  }

  @Test
  void aSystemWithOnePartIsTheSystem() {
    SystemModel alone = system("system A over t from 0 to 1 { state x = 1; x' = -2*x + sin(t) }");
    SystemModel part =
        sound(
            read(
                "system A over t from 0 to 1 { state x = 1; x' = -2*x + sin(t) }\n"
                    + "system B over t from 0 to 1 { part a = A }",
                Map.of()),
            "B");
    assertEquals(equations(alone), equations(part).replace("a.x", "x"));
  }
}
