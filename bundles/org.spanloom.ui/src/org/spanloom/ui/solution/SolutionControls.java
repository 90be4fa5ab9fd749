/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Consumer;
import org.eclipse.swt.SWT;
import org.eclipse.swt.layout.GridData;
import org.eclipse.swt.layout.RowData;
import org.eclipse.swt.layout.RowLayout;
import org.eclipse.swt.widgets.Combo;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.swt.widgets.Control;
import org.eclipse.swt.widgets.Label;
import org.eclipse.swt.widgets.Text;
import org.spanloom.language.model.InitialValues;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.SystemModel;
import org.spanloom.ui.Labels;

/** Chooses what to solve, and which units the value axes show where there are more than two. */
final class SolutionControls {

  private static final String DECLARED = "as declared";
  private static final String NO_AXIS = "none";
  private static final int UNTIL_WIDTH = 60;

  private final Composite row;
  private final Combo system;
  private final Combo initial;
  private final Text until;
  private final Label timeUnit;
  private final Label axesLabel;
  private final Combo left;
  private final Combo right;
  private final Consumer<Choice> choiceChanged;
  private final Consumer<PlotAxes> axesChanged;
  private List<String> initialNames = List.of();

  SolutionControls(
      Composite parent, Consumer<Choice> choiceChanged, Consumer<PlotAxes> axesChanged) {
    this.choiceChanged = choiceChanged;
    this.axesChanged = axesChanged;
    row = new Composite(parent, SWT.NONE);
    RowLayout layout = new RowLayout(SWT.HORIZONTAL);
    layout.center = true;
    layout.spacing = 6;
    row.setLayout(layout);
    row.setLayoutData(new GridData(SWT.FILL, SWT.TOP, true, false));
    label("System:");
    system = combo(this::tellChoice);
    label("Initial values:");
    initial = combo(this::tellChoice);
    label("Until:");
    until = new Text(row, SWT.BORDER | SWT.SINGLE);
    until.setLayoutData(new RowData(UNTIL_WIDTH, SWT.DEFAULT));
    until.setMessage("end");
    until.setToolTipText("Last time shown; empty for the end of the interval");
    until.addListener(SWT.DefaultSelection, e -> tellChoice());
    until.addListener(SWT.FocusOut, e -> tellChoice());
    timeUnit = label("");
    axesLabel = label("Axes:");
    left = combo(this::tellAxes);
    right = combo(this::tellAxes);
    showAxes(List.of(), new PlotAxes("", Optional.empty()));
  }

  private Label label(String text) {
    Label label = new Label(row, SWT.NONE);
    label.setText(text);
    return label;
  }

  private Combo combo(Runnable changed) {
    Combo combo = new Combo(row, SWT.DROP_DOWN | SWT.READ_ONLY);
    combo.addListener(SWT.Selection, e -> changed.run());
    return combo;
  }

  Control control() {
    return row;
  }

  /** Lists the systems of a model and shows a choice; tells nobody. */
  void show(Model model, Choice choice) {
    set(system, model.systems().stream().map(SystemModel::name).toList(), choice.system());
    Optional<SystemModel> chosen = choice.systemIn(model);
    initialNames =
        chosen
            .map(s -> s.initialValues().stream().map(InitialValues::name).toList())
            .orElse(List.of());
    set(
        initial,
        initialNames.stream().map(SolutionControls::shownInitial).toList(),
        shownInitial(choice.initial()));
    initial.setEnabled(initialNames.size() > 1);
    if (!until.isFocusControl()) {
      String text =
          choice.until().isPresent() ? Labels.number(choice.until().getAsDouble(), 17) : "";
      if (!until.getText().equals(text)) {
        until.setText(text);
      }
    }
    timeUnit.setText(chosen.map(s -> s.timeUnit().code()).filter(u -> !u.equals("1")).orElse(""));
    row.layout(true, true);
  }

  /** Shows the choices, or leaves their place to others while there is nothing to choose. */
  void setVisible(boolean visible) {
    row.setVisible(visible);
    ((GridData) row.getLayoutData()).exclude = !visible;
    row.getParent().layout(true, true);
  }

  private static String shownInitial(String name) {
    return name.isEmpty() ? DECLARED : name;
  }

  private static void set(Combo combo, List<String> items, String chosen) {
    if (!List.of(combo.getItems()).equals(items)) {
      combo.setItems(items.toArray(String[]::new));
    }
    combo.select(items.indexOf(chosen));
  }

  /** Offers the units for the axes; hides the offer while two axes are enough. */
  void showAxes(List<String> units, PlotAxes axes) {
    boolean needed = units.size() > 2;
    for (Control control : List.of(axesLabel, left, right)) {
      control.setVisible(needed);
      RowData data = new RowData();
      data.exclude = !needed;
      control.setLayoutData(data);
    }
    if (needed) {
      set(left, units, axes.left());
      List<String> rightUnits = new ArrayList<>(units);
      rightUnits.addFirst(NO_AXIS);
      set(right, rightUnits, axes.right().orElse(NO_AXIS));
    }
    row.getParent().layout(true, true);
  }

  private void tellChoice() {
    if (system.getSelectionIndex() < 0) {
      return;
    }
    int set = initial.getSelectionIndex();
    choiceChanged.accept(
        new Choice(
            system.getText(),
            set < 0 ? "" : initialNames.get(set),
            parsed(until.getText().strip())));
  }

  private OptionalDouble parsed(String text) {
    if (text.isEmpty()) {
      return OptionalDouble.empty();
    }
    try {
      double value = Double.parseDouble(text);
      if (Double.isFinite(value)) {
        return OptionalDouble.of(value);
      }
    } catch (NumberFormatException e) {
      // Said below.
    }
    until.setText("");
    until.setMessage("a number");
    return OptionalDouble.empty();
  }

  private void tellAxes() {
    String rightUnit = right.getText();
    axesChanged.accept(
        new PlotAxes(
            left.getText(),
            rightUnit.equals(NO_AXIS) || rightUnit.equals(left.getText())
                ? Optional.empty()
                : Optional.of(rightUnit)));
  }
}
