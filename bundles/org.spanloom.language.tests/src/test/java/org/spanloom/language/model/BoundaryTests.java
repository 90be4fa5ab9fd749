/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class BoundaryTests {

  private static final String HEAD =
      """
      system Wall over t [h] from 0 to 48 {
        parameter g [/h] = 0.2
        state T_air [Cel]
        state T_wall [K]
        T_air' = g*(T_wall - T_air)
        T_wall' = g*(T_air - T_wall)
        output gap [K] = T_wall - T_air
      """;

  private static String conditions(String lines) {
    SystemModel system = ModelListing.system(HEAD + "boundary soak {\n" + lines + "\n}\n}");
    StringBuilder list = new StringBuilder();
    for (Boundary.Condition c : system.boundaries().getFirst().conditions()) {
      AffineValue left = new AffineValue(c.samples(), Term.ZERO, c.dimension(), c.unit(), c.span());
      list.append(ModelListing.affine(system, left))
          .append(" = ")
          .append(ModelListing.text(system, c.rightSide()))
          .append(" in ")
          .append(c.unit().code())
          .append('\n');
    }
    return list.toString();
  }

  @Test
  void aLoneNumberTakesTheUnitOfTheStateOrOutput() {
    assertEquals(
        """
        (1) T_air(0) + 0 = 277.15 in Cel
        (-1) T_air(172800) + (1) T_wall(172800) + 0 = 2 in K
        """,
        conditions("T_air(0) = 4\ngap(48) = 2"));
  }

  @Test
  void bothSidesMayHoldStates() {
    assertEquals(
        """
        (1) T_air(0) + (-1) T_air(172800) + 0 = 0 in Cel
        (1) T_wall(before 86400) + (-1) T_wall(0) + 0 = 3 in K
        """,
        conditions("T_air(0) = T_air(48)\nT_wall(before 24) = T_wall(0) + 3 [K]"));
  }

  @Test
  void theNumberMayStandOnTheLeft() {
    assertEquals(
        """
        (-1) T_wall(0) + 0 = -280 in K
        (1) T_wall(0) + (1) T_wall(43200) + 0 = 600 in K
        """,
        conditions("280 = T_wall(0); T_wall(0) + T_wall(12) = 600 [K]"));
  }

  @Test
  void namesAndPlacesAreKept() {
    String text = HEAD + "boundary soak { T_air(0) = 1; T_wall(0) = 2 }\n}";
    SystemModel system = ModelListing.system(text);
    Boundary boundary = system.boundaries().getFirst();
    assertEquals("soak", boundary.name());
    assertEquals(
        List.of("T_air(0) = 1", "T_wall(0) = 2"),
        boundary.conditions().stream()
            .map(c -> text.substring(c.span().start(), c.span().end()))
            .toList());
    assertEquals(
        Optional.of(new Term.Constant(0)),
        boundary.conditions().getFirst().samples().getFirst().at());
  }
}
