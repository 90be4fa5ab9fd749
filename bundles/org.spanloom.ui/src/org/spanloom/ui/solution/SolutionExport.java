/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Optional;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.ICoreRunnable;
import org.eclipse.core.runtime.IStatus;
import org.eclipse.core.runtime.Status;
import org.eclipse.core.runtime.jobs.Job;
import org.eclipse.swt.SWT;
import org.eclipse.swt.SWTException;
import org.eclipse.swt.graphics.ImageData;
import org.eclipse.swt.graphics.ImageLoader;
import org.eclipse.swt.widgets.FileDialog;
import org.eclipse.swt.widgets.Shell;
import org.spanloom.analysis.solve.SolutionTable;
import org.spanloom.ui.UiIds;

/** Writes a solution to files, in the background; a failure leaves no half file. */
final class SolutionExport {

  private SolutionExport() {}

  /** Asks for a file and writes the table. */
  static void table(Shell shell, SolutionTable table) {
    ask(shell, "Export Table", table.system() + ".csv", "*.csv")
        .ifPresent(file ->
            write(
                file,
                part -> Files.writeString(part, SolutionCsv.of(table), StandardCharsets.UTF_8)));
  }

  /** Asks for a file and writes the picture. */
  static void picture(Shell shell, String name, ImageData picture) {
    ask(shell, "Export Picture", name + ".png", "*.png")
        .ifPresent(file ->
            write(
                file,
                part -> {
                  ImageLoader loader = new ImageLoader();
                  loader.data = new ImageData[] {picture};
                  loader.save(part.toString(), SWT.IMAGE_PNG);
                }));
  }

  private static Optional<Path> ask(Shell shell, String title, String name, String pattern) {
    FileDialog dialog = new FileDialog(shell, SWT.SAVE);
    dialog.setText(title);
    dialog.setFileName(name);
    dialog.setFilterExtensions(new String[] {pattern, "*"});
    dialog.setOverwrite(true);
    return Optional.ofNullable(dialog.open()).map(Path::of);
  }

  /** Writes the content of a file. */
  private interface Content {
    void writeTo(Path part) throws IOException;
  }

  private static void write(Path file, Content content) {
    ICoreRunnable writing =
        monitor -> {
          try {
            Path part = Files.createTempFile(file.toAbsolutePath().getParent(), ".export", null);
            try {
              content.writeTo(part);
              Files.move(part, file, StandardCopyOption.REPLACE_EXISTING);
            } finally {
              Files.deleteIfExists(part);
            }
          } catch (IOException | SWTException e) {
            IStatus status =
                new Status(
                    IStatus.ERROR,
                    UiIds.BUNDLE,
                    file + " could not be written: " + e.getMessage(),
                    e);
            throw new CoreException(status);
          }
        };
    Job job = Job.create("Writing " + file, writing);
    job.setUser(true);
    job.schedule();
  }
}
