package org.edgefield.importer.step;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Locale;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicBoolean;
import org.edgefield.importer.ModelException;
import org.edgefield.importer.Progress;
import org.edgefield.importer.kernel.NativeFiles;

/**
 * The child process that reads a STEP file. It limits its own memory and processor time; this side
 * adds the wall-time limit and stops it when the caller gives up. Whatever happens to the child,
 * the outcome here is success or one {@link ModelException}.
 */
final class ReaderProcess implements AutoCloseable {
  private static final int CPU_SLACK_S = 5;
  private static final int CANCELLED_EXIT = 137;

  private final Process process;
  private final String file;
  private final ReadLimits limits;
  private final AtomicBoolean outOfTime = new AtomicBoolean();

  ReaderProcess(Path model, Path folder, ReadLimits limits) throws IOException {
    this.file = model.toString();
    this.limits = limits;
    long cpu_s = limits.time().toSeconds() + CPU_SLACK_S;
    process =
        new ProcessBuilder(
                NativeFiles.stepReader().toString(),
                model.toAbsolutePath().toString(),
                folder.toString(),
                Long.toString(limits.memory_bytes()),
                Long.toString(cpu_s),
                Long.toString(ProcessHandle.current().pid()),
                String.format(Locale.ROOT, "%.17g", limits.largest_m() * 1000),
                String.format(Locale.ROOT, "%.17g", limits.meshAngle_rad()))
            .directory(folder.toFile())
            .redirectError(ProcessBuilder.Redirect.DISCARD)
            .start();
  }

  /** Waits for the child to finish. */
  void await(Progress progress) throws IOException {
    Thread watchdog = new Thread(this::watch, "step-reader limit");
    watchdog.setDaemon(true);
    watchdog.start();
    String phase = "start";
    ReaderLine refusal = null;
    boolean done = false;
    try (BufferedReader in =
        new BufferedReader(
            new InputStreamReader(process.getInputStream(), StandardCharsets.UTF_8))) {
      for (String text = in.readLine(); text != null; text = in.readLine()) {
        ReaderLine line = ReaderLine.parse(text);
        switch (line.word()) {
          case "phase" -> {
            phase = line.field(0);
            progress.report("read STEP", Double.NaN, phase);
          }
          case "refuse" -> refusal = line;
          case "done" -> done = true;
          default -> throw new IllegalStateException("unknown line " + text);
        }
      }
    }
    if (done) {
      return;
    }
    if (refusal != null) {
      throw Refusals.of(file, refusal);
    }
    throw died(phase);
  }

  private void watch() {
    try {
      if (!process.waitFor(limits.time().toMillis(), TimeUnit.MILLISECONDS)) {
        outOfTime.set(true);
        process.destroyForcibly();
      }
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    }
  }

  private ModelException died(String phase) {
    int exit = exitCode();
    if (outOfTime.get()) {
      return new ModelException(
          String.format(
              Locale.ROOT,
              "%s: not read within %d s (while in phase '%s'); simplify the model or raise the time"
                  + " limit",
              file,
              limits.time().toSeconds(),
              phase));
    }
    return new ModelException(
        String.format(
            Locale.ROOT,
            "%s: the CAD kernel broke down in phase '%s' (code %d), the file is damaged or beyond it;"
                + " export the model again as AP203, AP214 or AP242",
            file,
            phase,
            exit));
  }

  private int exitCode() {
    try {
      return process.waitFor();
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      return CANCELLED_EXIT;
    }
  }

  /** Stops the child if it still runs, and waits until it is gone. */
  @Override
  public void close() {
    if (process.isAlive()) {
      process.destroyForcibly();
    }
    exitCode();
  }
}
