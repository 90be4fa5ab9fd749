/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.spanloom.analysis.solve.Choice;
import org.spanloom.analysis.structure.SystemStructure;
import org.spanloom.analysis.structure.SystemStructure.Dependence;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.model.SystemModel;
import picocli.CommandLine.Model.CommandSpec;

/** {@code spanloom structure}: lists which state depends on which, and the blocks of A. */
final class StructureCommand {

  private static final int BLOCKS_SHOWN = 40;
  private static final int STATES_SHOWN = 12;

  private final Options.Values values;
  private final Streams streams;

  StructureCommand(Options.Values values, Streams streams) {
    this.values = values;
    this.streams = streams;
  }

  static void describe(CommandSpec spec) {
    spec.addPositional(Options.operand("FILE", "the model file"));
    spec.addOption(Options.one("--system", "NAME", "which system; needed if there are several"));
    spec.addOption(
        Options.one("--state", "NAME", "list what this state depends on, directly or not"));
    spec.addOption(
        Options.one("--output", "FILE", "write the list to FILE instead of standard output"));
    spec.usageMessage()
        .description(
            "Lists as comma-separated values which state depends directly on which: the block of"
                + " the state, the state, what it depends on, and the lines of the model that make"
                + " it so. Named expressions and outputs are resolved. The states of a block depend"
                + " on each other; a block depends on those before it at most.",
            "The blocks go to standard error as well, one a line.%n");
  }

  int run() throws CommandFailure {
    String file = values.operand();
    Path path = ModelDoor.path(file);
    Model model = ModelDoor.open(path);
    SystemStructure structure = structure(model, file);
    Optional<String> state = values.one("--state");
    List<String> lines =
        state.isPresent()
            ? reached(model, structure, component(structure, state.get(), file))
            : direct(model, structure);
    try (ResultSink sink = ResultSink.of(values.one("--output"), Optional.of(path), streams)) {
      for (String line : lines) {
        sink.write(line);
      }
      sink.commit();
    }
    streams.err().print(summary(structure));
    streams.err().flush();
    return ExitCode.CLEAN;
  }

  private SystemStructure structure(Model model, String file) throws CommandFailure {
    if (model.systems().isEmpty()) {
      throw CommandFailure.of(false, file + " declares no system");
    }
    try {
      SystemModel system =
          Choice.pick("system", model.systems(), SystemModel::name, values.one("--system"), file);
      return SystemStructure.of(system)
          .orElseThrow(() ->
              CommandFailure.of(
                  false,
                  "system "
                      + system.name()
                      + " has errors, so that its equations are not known; 'spanloom check "
                      + file
                      + "' lists them."));
    } catch (Choice.RefusedException refused) {
      throw CommandFailure.of(refused.isUsage(), refused.getMessage());
    }
  }

  private static int component(SystemStructure structure, String state, String file)
      throws CommandFailure {
    try {
      return Choice.pick(
              "state",
              structure.system().states(),
              StateComponent::label,
              Optional.of(state),
              structure.system().name() + " in " + file)
          .index();
    } catch (Choice.RefusedException refused) {
      throw CommandFailure.of(refused.isUsage(), refused.getMessage());
    }
  }

  private static List<String> direct(Model model, SystemStructure structure) {
    List<String> lines =
        new ArrayList<>(List.of(CsvLine.ofNames(List.of("block", "state", "depends_on", "lines"))));
    int number = 0;
    for (List<Integer> block : structure.blocks()) {
      number++;
      for (int i : block) {
        String head = number + "," + quoted(label(structure, i)) + ",";
        if (structure.dependences().get(i).isEmpty()) {
          lines.add(head + ",\n");
        }
        for (Dependence dependence : structure.dependences().get(i)) {
          lines.add(
              head
                  + quoted(label(structure, dependence.on()))
                  + ","
                  + lines(model, dependence)
                  + "\n");
        }
      }
    }
    return lines;
  }

  private static List<String> reached(Model model, SystemStructure structure, int component) {
    Map<Integer, Dependence> direct = new LinkedHashMap<>();
    structure.dependences().get(component).forEach(d -> direct.put(d.on(), d));
    List<String> lines =
        new ArrayList<>(List.of(CsvLine.ofNames(List.of("depends_on", "direct", "lines"))));
    for (int on : structure.dependsOn(component)) {
      Dependence dependence = direct.get(on);
      lines.add(
          quoted(label(structure, on))
              + (dependence == null ? ",no," : ",yes," + lines(model, dependence))
              + "\n");
    }
    return lines;
  }

  private static String quoted(String label) {
    return CsvLine.ofNames(List.of(label)).strip();
  }

  private static String label(SystemStructure structure, int component) {
    return structure.system().states().get(component).label();
  }

  private static String lines(Model model, Dependence dependence) {
    return dependence.sources().stream()
        .map(s -> model.source().line(s.start()))
        .distinct()
        .map(String::valueOf)
        .collect(Collectors.joining(" "));
  }

  private static String summary(SystemStructure structure) {
    int n = structure.system().states().size();
    int count = structure.blocks().size();
    StringBuilder text = new StringBuilder("system ").append(structure.system().name());
    text.append(": ").append(n).append(n == 1 ? " state" : " states");
    text.append(" in ").append(count).append(count == 1 ? " block\n" : " blocks\n");
    for (int b = 0; b < Math.min(count, BLOCKS_SHOWN); b++) {
      List<Integer> block = structure.blocks().get(b);
      String states =
          block.stream()
              .limit(STATES_SHOWN)
              .map(i -> label(structure, i))
              .collect(Collectors.joining(", "));
      text.append("  ").append(b + 1).append(": ").append(states);
      text.append(
          block.size() > STATES_SHOWN ? " and " + (block.size() - STATES_SHOWN) + " more\n" : "\n");
    }
    if (count > BLOCKS_SHOWN) {
      text.append("  ... and ").append(count - BLOCKS_SHOWN).append(" more\n");
    }
    return text.toString();
  }
}
