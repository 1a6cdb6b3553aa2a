package sojourn.report;

import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import sojourn.archive.Caution;
import sojourn.evidence.Answer;
import sojourn.evidence.FitsTold;
import sojourn.evidence.RegimeFindings;
import sojourn.evidence.RegimeInquiry;
import sojourn.evidence.WalkedRegimes;

/** What was found of a strategy's regimes as a terminal shows it, at most 100 columns wide: the caution first, then question by question. */
public final class RegimesText {
    private static final int REFUSALS = 3;

    private RegimesText() {}

    /** The whole text. */
    public static String of(RegimeInquiry inquiry) {
        RegimeFindings found = inquiry.findings();
        StringBuilder text = new StringBuilder();
        text.append(Lines.wrapped(Caution.TEXT, 0)).append('\n');
        text.append(headline(inquiry)).append('\n');
        text.append(section(
                "Who are the regimes?", found.cards().map(cards -> RegimeCardsText.of(found.subject(), cards))));
        text.append(section(
                "Are they the same from fit to fit?",
                found.lineage().map(lineage -> RegimeCardsText.of(found.subject(), lineage))));
        text.append(ContestText.of(found));
        text.append(section(
                "Are the forecast distributions" + ofWhat(found.subject()) + " right?",
                found.residuals().map(FitnessText::of)));
        text.append(section(
                "Does the model reproduce fat tails and clustering" + ofWhat(found.subject()) + "?",
                found.reproduction().map(FitnessText::of)));
        text.append(section(
                "What hangs on single bars?", found.influence().map(all -> SingleBarsText.of(found.subject(), all))));
        text.append(section(
                "Which bars surprised most?", found.residuals().map(all -> SingleBarsText.of(found.subject(), all))));
        text.append("belongs to digest ").append(inquiry.comparisonDigest()).append('\n');
        return text.toString();
    }

    private static String ofWhat(WalkedRegimes subject) {
        return subject.firstOfSeveral().map(one -> " of the " + one).orElse("");
    }

    /** A question with its answer, or with the reason why there is none. */
    static String section(String question, Answer<String> answer) {
        String text = answer.found().orElseGet(() -> Lines.wrapped("Undefined, because " + answer.because() + ".", 0));
        return question + '\n' + text + '\n';
    }

    private static String headline(RegimeInquiry inquiry) {
        RegimeFindings found = inquiry.findings();
        WalkedRegimes subject = found.subject();
        FitsTold fits = found.fits();
        StringBuilder text = new StringBuilder("Regimes of '")
                .append(inquiry.ready().file().strategy().name())
                .append("': ")
                .append(subject.gauge())
                .append(" on the ")
                .append(subject.regimes().observe().stream()
                        .map(one -> one.inWords().replace('-', ' '))
                        .collect(Collectors.joining(" and the ")))
                .append("; ")
                .append(fits.fits())
                .append(fits.fits() == 1 ? " fit" : " fits")
                .append(outcomes(fits))
                .append('.');
        if (subject.timeline().firstBar().isPresent()) {
            text.append(" Known from ")
                    .append(subject.date(subject.timeline().firstBar().getAsInt()))
                    .append(" to ")
                    .append(subject.date(subject.timeline().endBar() - 1))
                    .append('.');
        }
        if (subject.regimes().fixed().isPresent()) {
            text.append(" Its parameters are an external prior: declared, not fitted. If they were estimated on this"
                    + " period, every figure here has seen its own future.");
        }
        if (subject.regimes().given().isPresent()) {
            text.append(" Its probabilities were computed elsewhere and are not audited for how they were computed.");
        }
        text.append(numbers(subject, fits)).append(starts(fits));
        StringBuilder all = new StringBuilder(Lines.wrapped(text.toString(), 0));
        List<String> refused = fits.refused();
        for (String one : refused.subList(0, Math.min(REFUSALS, refused.size()))) {
            all.append(Lines.wrapped("  " + one, 4));
        }
        if (refused.size() > REFUSALS) {
            all.append("  and ").append(refused.size() - REFUSALS).append(" more, see regimes.json\n");
        }
        return all.toString();
    }

    private static String outcomes(FitsTold fits) {
        String all = fits.outcomes().entrySet().stream()
                .map((Map.Entry<String, Integer> one) -> one.getValue() + " " + one.getKey())
                .collect(Collectors.joining(", "));
        return all.isEmpty() ? "" : " (" + all + ")";
    }

    private static String numbers(WalkedRegimes subject, FitsTold fits) {
        return subject.regimes()
                .particulars()
                .choose()
                .map(choice -> fits.numbers().entrySet().stream()
                        .map((Map.Entry<Integer, Integer> one) -> one.getKey() + " in " + one.getValue())
                        .collect(Collectors.joining(
                                ", ",
                                " Each fit chose the number of regimes by "
                                        + choice.by().word() + ": ",
                                "; it changed " + fits.changes() + (fits.changes() == 1 ? " time." : " times."))))
                .orElse("");
    }

    private static String starts(FitsTold fits) {
        if (fits.searched() == 0) {
            return "";
        }
        String second = fits.rivalled() == 0
                ? ""
                : " A second best maximum lay within 2 nats in " + fits.rivalled() + " of them.";
        return " In " + fits.allAgreed() + " of " + fits.searched()
                + " fits that were searched for, every start ended at the same likelihood"
                + (fits.allAgreed() == fits.searched()
                        ? "."
                        : "; in the worst, " + Figures.percent(fits.leastShare()) + " of them.")
                + second;
    }
}
