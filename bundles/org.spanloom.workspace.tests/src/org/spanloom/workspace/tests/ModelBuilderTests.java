/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.resources.IProjectDescription;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IPath;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.spanloom.workspace.Ids;
import org.spanloom.workspace.MarkerAttributes;
import org.spanloom.workspace.ModelFile;

/** The builder keeps the markers of a project in step with its files. */
class ModelBuilderTests {

  /** One line: an unknown name in the equation. */
  private static final String FAULTY =
      """
      system Tank over t [h] from 0 to 4 {
        state level [m] = 2
        level' = -leek*level
      }
      """;

  private static final String SOUND =
      """
      system Tank over t [h] from 0 to 4 {
        parameter leak [1/h] = 0.3
        state level [m] = 2
        level' = -leak*level
        basis Phi at 0
        require level < 3 [m] throughout
      }
      """;

  private TestProject project;

  @BeforeEach
  void makeProject() throws CoreException {
    project = new TestProject("builder");
  }

  @AfterEach
  void deleteProject() throws CoreException {
    project.close();
  }

  @Test
  void marksAFaultAtItsLineAndForgetsItWhenItIsMended() throws CoreException {
    IFile file = project.write("tank.span", FAULTY);
    project.build();
    List<IMarker> markers = TestProject.markers(file, Ids.PROBLEM);
    IMarker unknown =
        markers.stream()
            .filter(m -> m.getAttribute(MarkerAttributes.CODE, "").equals("name-unknown"))
            .findFirst()
            .orElseThrow(() -> new AssertionError(markers.toString()));
    assertEquals(3, TestProject.line(unknown));
    assertEquals(IMarker.SEVERITY_ERROR, unknown.getAttribute(IMarker.SEVERITY, -1));
    assertEquals("line 3", unknown.getAttribute(IMarker.LOCATION, ""));
    int start = unknown.getAttribute(IMarker.CHAR_START, -1);
    int end = unknown.getAttribute(IMarker.CHAR_END, -1);
    assertEquals("leek", FAULTY.substring(start, end));

    project.write("tank.span", SOUND);
    project.build();
    assertEquals(List.of(), TestProject.codes(file));
  }

  @Test
  void aSoundBasisIsListedWithNumbersButIsNoProblem() throws CoreException {
    IFile file = project.write("tank.span", SOUND);
    project.build();
    List<IMarker> bases = TestProject.markers(file, Ids.BASIS);
    assertEquals(1, bases.size());
    IMarker basis = bases.getFirst();
    assertEquals("Phi", basis.getAttribute(MarkerAttributes.BASIS, ""));
    assertEquals("Tank", basis.getAttribute(MarkerAttributes.SYSTEM, ""));
    // A basis of one function has condition 1 at every time.
    assertEquals(1.0, Double.parseDouble(basis.getAttribute(MarkerAttributes.RAW, "")), 1e-9);
    assertEquals(1.0, Double.parseDouble(basis.getAttribute(MarkerAttributes.SCALED, "")), 1e-9);
    assertTrue(Double.parseDouble(basis.getAttribute(MarkerAttributes.DIGITS_LEFT, "")) > 5);
    assertEquals(5, TestProject.line(basis));
    assertEquals(List.of(), TestProject.codes(file));
  }

  @Test
  void aBasisThatIsNoneIsListedByNameWithoutNumbers() throws CoreException {
    IFile file =
        project.write(
            "tank.span",
            """
            system Tanks over t [h] from 0 to 4 {
              state a = 1
              state b = 1
              a' = -0.3 [1/h]*a
              b' = -0.2 [1/h]*b
              basis pair at 0 =
                row a = 1, 2
                row b = 2, 4
            }
            """);
    project.build();
    assertEquals(List.of("basis-dependent"), TestProject.codes(file));
    IMarker basis = TestProject.markers(file, Ids.BASIS_FINDING).getFirst();
    assertEquals("Tanks", basis.getAttribute(MarkerAttributes.SYSTEM, ""));
    assertEquals("pair", basis.getAttribute(MarkerAttributes.BASIS, ""));
    assertEquals("", basis.getAttribute(MarkerAttributes.RAW, ""));
    assertEquals(IMarker.SEVERITY_ERROR, basis.getAttribute(IMarker.SEVERITY, -1));
  }

  @Test
  void resultsOfRequirementsAreMarkersToo() throws CoreException {
    IFile file = project.write("tank.span", SOUND);
    project.build();
    List<IMarker> held = TestProject.markers(file, Ids.REQUIREMENT);
    assertEquals(1, held.size());
    assertEquals("HELD", held.getFirst().getAttribute(MarkerAttributes.STATUS, ""));

    project.write("tank.span", SOUND.replace("level < 3", "level < 1"));
    project.build();
    IMarker failed = TestProject.markers(file, Ids.REQUIREMENT).getFirst();
    assertEquals("FAILED", failed.getAttribute(MarkerAttributes.STATUS, ""));
    // The level begins at 2 m, 1 m above what is required.
    assertEquals(-1.0, Double.parseDouble(failed.getAttribute(MarkerAttributes.MARGIN, "")), 1e-6);
    IMarker problem = TestProject.markers(file, Ids.PROBLEM).getFirst();
    assertEquals(6, TestProject.line(problem));
    assertEquals(IMarker.SEVERITY_ERROR, problem.getAttribute(IMarker.SEVERITY, -1));
  }

  @Test
  void checksOnlyWhatChanged() throws CoreException {
    IFile changed = project.write("changed.span", FAULTY);
    IFile other = project.write("other.span", FAULTY);
    project.build();
    List<Long> before = ids(other);
    List<Long> beforeChanged = ids(changed);
    project.write("changed.span", FAULTY + "\n");
    project.build();
    assertEquals(before, ids(other), "the markers of the other file must be the same ones");
    assertNotEquals(beforeChanged, ids(changed));
  }

  @Test
  void checksTheModelsThatUseAFileWhenItChanges() throws CoreException {
    IFile zone = project.write("zone.span", "parameter leak = 0.5\n");
    IFile user =
        project.write(
            "user.span",
            """
            import "between.span"
            system Tank over t from 0 to 4 {
              state level = 2
              level' = -drain*level
            }
            """);
    project.build();
    assertEquals(List.of("file-missing"), TestProject.codes(user));
    project.write("between.span", "import \"zone.span\"\nparameter drain = 2*leak\n");
    project.build();
    assertEquals(List.of(), TestProject.codes(user));
    project.write("zone.span", "parameter leek = 0.5\n");
    project.build();
    assertEquals(List.of("import-broken"), TestProject.codes(user));
    project.write("zone.span", "parameter leak = 0.25\n");
    project.build();
    assertEquals(List.of(), TestProject.codes(user));
    zone.delete(true, null);
    project.build();
    assertEquals(List.of("import-broken"), TestProject.codes(user));
  }

  @Test
  void aLinkedFileIsOutsideOfTheProject(@TempDir Path folder) throws Exception {
    Path outside = Files.writeString(folder.resolve("outside.span"), "parameter a = 1\n");
    project.file("linked.span").createLink(outside.toUri(), IResource.NONE, null);
    IFile user = project.write("user.span", "import \"linked.span\"\n");
    project.build();
    assertEquals(List.of("file-outside-project"), TestProject.codes(user));
  }

  @Test
  void checksAllModelsWhenTheSettingsChange() throws CoreException {
    IFile file = project.write("tank.span", FAULTY);
    project.build();
    List<Long> before = ids(file);
    project.write("spanloom.settings", "digits.wanted = 9\n");
    project.build();
    List<Long> after = ids(file);
    assertNotEquals(before, after);
    project.file("spanloom.settings").delete(true, null);
    project.build();
    assertNotEquals(after, ids(file));
  }

  @Test
  void marksLinesOfTheSettingsThatCannotBeRead() throws CoreException {
    IFile settings = project.write("spanloom.settings", "# ours\ndigits.wonted = 9\n");
    project.build();
    IMarker marker = TestProject.markers(settings, Ids.PROBLEM).getFirst();
    assertEquals(2, TestProject.line(marker));
    assertTrue(marker.getAttribute(IMarker.MESSAGE, "").startsWith("'digits.wonted = 9'"));
    project.write("spanloom.settings", "digits.wanted = 9\n");
    project.build();
    assertEquals(List.of(), TestProject.markers(settings, Ids.PROBLEM));
  }

  @Test
  void aFileThatIsNoModelAnyMoreLosesItsMarkers() throws CoreException {
    IFile file = project.write("tank.span", FAULTY);
    project.build();
    assertTrue(!TestProject.codes(file).isEmpty());
    file.move(IPath.fromOSString("tank.txt"), true, null);
    project.build();
    assertEquals(List.of(), TestProject.codes(project.project()));
  }

  @Test
  void aDeletedFileTakesItsMarkersAlong() throws CoreException {
    project.write("tank.span", FAULTY);
    project.build();
    project.file("tank.span").delete(true, null);
    project.build();
    assertEquals(List.of(), TestProject.codes(project.project()));
  }

  @Test
  void withoutTheNatureThereAreNoMarkers() throws CoreException {
    project.write("tank.span", FAULTY);
    project.build();
    IProjectDescription description = project.project().getDescription();
    description.setNatureIds(new String[0]);
    project.project().setDescription(description, null);
    assertEquals(List.of(), TestProject.codes(project.project()));
    assertEquals(0, project.project().getDescription().getBuildSpec().length);
  }

  @Test
  void bytesThatAreNoTextGiveAMessage() throws CoreException {
    IFile zeros = project.write("zeros.span", new byte[] {'s', 0, 1, 2});
    IFile latin =
        project.write("latin.span", "# caf\u00e9\n".getBytes(StandardCharsets.ISO_8859_1));
    project.build();
    assertEquals(List.of("file-not-text"), TestProject.codes(zeros));
    assertEquals(List.of("file-not-text"), TestProject.codes(latin));
    String message =
        TestProject.markers(latin, Ids.PROBLEM).getFirst().getAttribute(IMarker.MESSAGE, "");
    assertTrue(message.contains("UTF-8"), message);
  }

  @Test
  void aByteOrderMarkShiftsNothing() throws CoreException {
    IFile file = project.write("tank.span", "\uFEFF" + FAULTY);
    project.build();
    IMarker marker =
        TestProject.markers(file, Ids.PROBLEM).stream()
            .filter(m -> m.getAttribute(MarkerAttributes.CODE, "").equals("name-unknown"))
            .findFirst()
            .orElseThrow();
    assertEquals(FAULTY.indexOf("leek"), marker.getAttribute(IMarker.CHAR_START, -1));
  }

  @Test
  void aFileLargerThanTheLimitIsNotRead() throws CoreException, IOException {
    IFile file = project.write("large.span", "");
    try (RandomAccessFile large = new RandomAccessFile(file.getLocation().toFile(), "rw")) {
      large.setLength(ModelFile.LARGEST + 1L);
    }
    file.refreshLocal(IResource.DEPTH_ZERO, null);
    project.build();
    assertEquals(List.of("file-too-large"), TestProject.codes(file));
  }

  private static List<Long> ids(IFile file) throws CoreException {
    return TestProject.markers(file, Ids.PROBLEM).stream().map(IMarker::getId).toList();
  }
}
