/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.grammar;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.spanloom.language.grammar.Grammar.Choice;
import org.spanloom.language.grammar.Grammar.Maybe;
import org.spanloom.language.grammar.Grammar.Part;
import org.spanloom.language.grammar.Grammar.Reference;
import org.spanloom.language.grammar.Grammar.Repeated;
import org.spanloom.language.grammar.Grammar.Sequence;
import org.spanloom.language.grammar.Grammar.Special;
import org.spanloom.language.grammar.Grammar.Terminal;

/** Makes texts that follow a grammar, by chance, the same ones for the same seed. */
final class Sentences {

  /** What stands for things that the grammar says in words. */
  private static final Map<String, List<String>> SPECIAL =
      Map.of(
          "a letter of Unicode", List.of("b", "c", "K", "x", "y", "T", "é", "ω"),
          "a unit in UCUM code, with balanced brackets",
              List.of("m", "kg.m/s2", "1/h", "[in_i]", "%", "kJ/(m2.K)", "10*3"),
          "a line feed, a carriage return, or both", List.of("\n", "\r\n", "\n"),
          "the end of the text, or the place before a closing brace", List.of("\n"),
          "anything up to the end of the line", List.of(" a remark"),
          "anything but a quotation mark or the end of the line", List.of("a file.csv", "b/c.mtx"));

  private static final int REPEATS = 3;

  private final Grammar grammar;
  private final Random random;
  private final int depthLimit;
  private final Map<String, Integer> least = new HashMap<>();

  Sentences(Grammar grammar, long seed, int depthLimit) {
    this.grammar = grammar;
    this.random = new Random(seed);
    this.depthLimit = depthLimit;
    depths();
  }

  /** Returns a text that follows a rule. */
  String sentence(String rule) {
    StringBuilder text = new StringBuilder();
    write(grammar.rule(rule), 0, grammar.isLexical(rule), text);
    return text.toString();
  }

  private void write(Part part, int depth, boolean oneSign, StringBuilder text) {
    switch (part) {
      case Terminal terminal -> add(terminal.text(), oneSign, text);
      case Special special -> {
        List<String> texts = SPECIAL.get(special.words());
        if (texts == null) {
          throw new IllegalStateException("nothing stands for ?" + special.words() + "?");
        }
        add(texts.get(random.nextInt(texts.size())), oneSign, text);
      }
      case Reference reference -> {
        boolean sign = oneSign || grammar.isLexical(reference.rule());
        StringBuilder inner = new StringBuilder();
        write(grammar.rule(reference.rule()), depth + 1, sign, sign ? inner : text);
        if (sign) {
          add(inner.toString(), oneSign, text);
        }
      }
      case Sequence sequence -> sequence.parts().forEach(p -> write(p, depth, oneSign, text));
      case Choice choice -> write(choose(choice.parts(), depth), depth, oneSign, text);
      case Maybe maybe -> {
        if (depth < depthLimit && random.nextBoolean()) {
          write(maybe.part(), depth, oneSign, text);
        }
      }
      case Repeated repeated -> {
        int times = depth < depthLimit ? random.nextInt(REPEATS) : 0;
        for (int i = 0; i < times; i++) {
          write(repeated.part(), depth, oneSign, text);
        }
      }
    }
  }

  private void add(String sign, boolean oneSign, StringBuilder text) {
    text.append(sign).append(oneSign || sign.isBlank() ? "" : " ");
  }

  /** Beyond the limit the shallowest way is taken, so that every sentence ends. */
  private Part choose(List<Part> parts, int depth) {
    if (depth < depthLimit) {
      return parts.get(random.nextInt(parts.size()));
    }
    return parts.stream().min((a, b) -> Integer.compare(depth(a), depth(b))).orElseThrow();
  }

  private void depths() {
    boolean changed = true;
    while (changed) {
      changed = false;
      for (Map.Entry<String, Part> rule : grammar.rules().entrySet()) {
        int depth = depth(rule.getValue()) + 1;
        changed |= depth < least.getOrDefault(rule.getKey(), infinite());
        least.merge(rule.getKey(), depth, Math::min);
      }
    }
  }

  private static int infinite() {
    return 1_000_000;
  }

  private int depth(Part part) {
    return switch (part) {
      case Terminal terminal -> 0;
      case Special special -> 0;
      case Reference reference -> least.getOrDefault(reference.rule(), infinite());
      case Sequence sequence -> sequence.parts().stream().mapToInt(this::depth).max().orElse(0);
      case Choice choice -> choice.parts().stream().mapToInt(this::depth).min().orElse(0);
      case Maybe maybe -> 0;
      case Repeated repeated -> 0;
    };
  }
}
