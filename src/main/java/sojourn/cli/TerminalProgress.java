package sojourn.cli;

import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import me.tongfei.progressbar.ConsoleProgressBarConsumer;
import me.tongfei.progressbar.ProgressBar;
import me.tongfei.progressbar.ProgressBarBuilder;
import me.tongfei.progressbar.ProgressBarStyle;
import org.jspecify.annotations.Nullable;
import sojourn.compare.Progress;

/** A bar on a watched terminal; nothing elsewhere. */
final class TerminalProgress implements Progress {
    private @Nullable ProgressBar bar;

    private TerminalProgress() {}

    static Progress on(Console console) {
        return console.terminal() == Terminal.WATCHED ? new TerminalProgress() : Progress.silent();
    }

    @Override
    public synchronized void begin(String stage, long steps) {
        bar = new ProgressBarBuilder()
                .setTaskName(stage)
                .setInitialMax(steps)
                .setStyle(ProgressBarStyle.ASCII)
                .setUnit(" bars", 1)
                .setConsumer(new ConsoleProgressBarConsumer(new PrintStream(System.err, true, StandardCharsets.UTF_8)))
                .build();
    }

    @Override
    public synchronized void advance(long steps) {
        if (bar != null) {
            bar.stepBy(steps);
        }
    }

    @Override
    public synchronized void end() {
        if (bar != null) {
            bar.close();
            bar = null;
        }
    }
}
