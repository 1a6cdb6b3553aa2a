package sojourn.cli;

import java.nio.file.Path;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import sojourn.archive.SealShelf;
import sojourn.compare.LocalWorkers;
import sojourn.compare.Prepared;
import sojourn.compare.Workers;
import sojourn.evidence.Answer;
import sojourn.latest.Latest;
import sojourn.latest.Seal;
import sojourn.latest.SealVerdict;
import sojourn.latest.Standing;
import sojourn.latest.TippingReturns;
import sojourn.market.HoldingsFile;
import sojourn.report.LatestJson;
import sojourn.report.LatestText;
import sojourn.report.SealText;

/** {@code sojourn latest}. */
@Command(
        name = "latest",
        mixinStandardHelpOptions = true,
        description = {
            "Tells what a strategy would do now: the regime after the last common close of its files, the forecast, the target"
                    + " and the reason, the orders in units, and which returns of the next bar would change its mind.",
            "",
            "Example: sojourn latest strategies/step-aside-in-storms.yaml --holdings mine.csv"
        })
final class LatestCommand implements Callable<Integer> {
    private static final int FOUND_SOMETHING = 3;

    private final Console console;

    @Spec
    @SuppressWarnings("NullAway.Init") // set by the command line library
    private CommandSpec spec;

    @Mixin
    private final OneStrategy strategy = new OneStrategy();

    @Option(
            names = "--holdings",
            paramLabel = "CSV",
            description =
                    "What you hold, a table with the columns asset and units; the row 'cash' is money. Without it, orders"
                            + " start from what the simulation holds.")
    private @Nullable Path holdings;

    @Option(
            names = "--seal",
            description =
                    "Write the decision and what it rests on under seal, chained to the seal before, below seals in"
                            + " the results.")
    private boolean seal;

    @Option(
            names = "--verify",
            paramLabel = "SEAL",
            description = "Tell instead whether a seal still holds: its chain, its rows of prices, its decision.")
    private @Nullable Path verify;

    @Mixin
    private final CommonOptions options = new CommonOptions();

    LatestCommand(Console console) {
        this.console = console;
    }

    @Override
    public Integer call() {
        options.refuseNonsense(spec);
        strategy.refuseFolder(spec);
        refuseContradictions();
        Prepared.Ready ready = Latest.prepared(strategy.read());
        try (Workers workers = new LocalWorkers(options.threads())) {
            return verify == null ? tell(ready, workers) : judge(verify, ready, workers);
        }
    }

    private int judge(Path file, Prepared.Ready ready, Workers workers) {
        SealVerdict verdict = SealVerdict.of(file, ready, workers, options.progress(console));
        console.out().print(options.json() ? SealText.json(verdict) : SealText.of(verdict));
        return verdict.holds() ? 0 : FOUND_SOMETHING;
    }

    private int tell(Prepared.Ready ready, Workers workers) {
        Optional<Map<String, Double>> held = Optional.ofNullable(holdings)
                .map(file -> HoldingsFile.read(file, ready.market().table().assets()));
        Standing standing = Latest.standing(ready, workers, options.progress(console));
        Latest latest = held.map(units -> Latest.of(ready, standing, units, String.valueOf(holdings)))
                .orElseGet(() -> Latest.of(ready, standing));
        Map<String, Answer<TippingReturns>> tipping = latest.tipping(workers);
        console.out()
                .print(
                        options.json()
                                ? LatestJson.of(latest, tipping)
                                : LatestText.of(
                                        latest,
                                        tipping,
                                        Optional.ofNullable(holdings).map(Path::toString)));
        if (seal) {
            SealShelf shelf = SealShelf.of(options.results(), strategy.resultName());
            String now = Instant.now().truncatedTo(ChronoUnit.SECONDS).toString();
            options.tell(console, Seal.put(shelf, latest, now));
        }
        return 0;
    }

    private void refuseContradictions() {
        if (verify != null && (seal || holdings != null)) {
            throw new ParameterException(
                    spec.commandLine(),
                    "--verify goes alone: a seal carries its own holdings, and nothing new is sealed");
        }
    }
}
