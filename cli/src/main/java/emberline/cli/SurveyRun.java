package emberline.cli;

import emberline.read.CandidateRows;
import emberline.read.CandidateSource;
import emberline.read.Checksum;
import emberline.read.ListedCandidate;
import emberline.reports.ledger.LedgerException;
import emberline.reports.ledger.ObjectEntry;
import emberline.reports.ledger.PlannedEntry;
import emberline.reports.ledger.RunIdentity;
import emberline.reports.ledger.RunLedger;
import emberline.reports.ledger.RunProgress;
import emberline.survey.Chain;
import emberline.survey.InputChecksum;
import emberline.survey.ObjectResult;
import emberline.survey.StageTimes.Stage;
import emberline.survey.Status;
import emberline.survey.SurveyPart;
import emberline.survey.SurveyRunner;
import emberline.survey.verdict.Verdicts;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Optional;

/**
 * A run over a list with a ledger: objects that were done before and have not changed are left as
 * they are, all others go through the chain; at the end the tables are written from the ledger. It
 * can be stopped at any moment and goes on when it is started again.
 */
final class SurveyRun {

    private final Path out;
    private final RunIdentity identity;
    private final RunFolder folder;
    private final Chain chain;
    private final CandidateSource source;
    private final SurveyPart part;
    private final InputChecksum inputs;
    private final Verdicts verdicts;

    /**
     * A run.
     *
     * @param out its folder
     * @param identity what it is
     * @param folder its files
     * @param chain what is done with each object
     * @param source its objects
     * @param part which of them
     * @param verdicts what the observer says of them
     */
    SurveyRun(
            Path out,
            RunIdentity identity,
            RunFolder folder,
            Chain chain,
            CandidateSource source,
            SurveyPart part,
            Verdicts verdicts) {
        this.verdicts = verdicts;
        this.out = out;
        this.identity = identity;
        this.folder = folder;
        this.chain = chain;
        this.source = source;
        this.part = part;
        this.inputs = new InputChecksum(source.folder());
    }

    /**
     * How a run ended.
     *
     * @param progress how far it is
     * @param unchanged number of objects that were left as they were
     * @param complete whether every object is done
     */
    record Ending(RunProgress progress, long unchanged, boolean complete) {}

    /**
     * A row and what the ledger knows of it.
     *
     * @param listed the row
     * @param planned what is known
     */
    private record PlannedRow(ListedCandidate listed, PlannedEntry planned) {}

    /**
     * What came of a row.
     *
     * @param name name of the object
     * @param status word of its status
     * @param reason why it failed
     * @param entry what is to be recorded; empty where nothing changed
     */
    private record Outcome(
            String name, String status, String reason, Optional<ObjectEntry> entry) {}

    /** What is done when the folder is taken and the number of objects known. */
    @FunctionalInterface
    interface Start {

        /** Gives the progress line of a number of objects. */
        Progress begin(long objects) throws IOException;
    }

    /**
     * Runs.
     *
     * @param threads number of threads
     * @param stop whether it shall end early
     * @param start what is done when the number of objects is known
     * @return how it ended
     * @throws IOException if the list cannot be read or something not be written
     */
    @SuppressWarnings("try") // the lock is held, not used
    Ending run(int threads, StopSignal stop, Start start) throws IOException, InterruptedException {
        try (RunLock lock = RunLock.of(out);
                RunLedger ledger = RunLedger.open(out, identity)) {
            return kept(ledger, () -> run(ledger, threads, stop, start));
        }
    }

    private Ending run(RunLedger ledger, int threads, StopSignal stop, Start start)
            throws IOException, InterruptedException {
        ledger.takeList(this::giveRows);
        RunProgress before = ledger.progress();
        Progress progress = start.begin(before.objects());
        if (!ledger.whyAnew().isEmpty()) {
            progress.say(
                    out
                            + ": an earlier run does not hold any more, all objects are done anew: "
                            + ledger.whyAnew());
        }
        long[] unchanged = {0};
        try (CandidateRows rows = source.open()) {
            SurveyRunner runner = new SurveyRunner(chain, threads);
            runner.run(
                    () -> next(rows, ledger, stop),
                    row -> outcome(row, runner),
                    outcome -> {
                        unchanged[0] += outcome.entry().isPresent() ? 0 : 1;
                        take(outcome, ledger, progress);
                    });
        }
        return ended(ledger, progress, unchanged[0]);
    }

    private void giveRows(RunLedger.RowTaker taker) throws IOException {
        try (CandidateRows rows = source.open()) {
            for (Optional<ListedCandidate> row = rows.next(); row.isPresent(); row = rows.next()) {
                String name = row.get().candidate().name();
                taker.take(row.get().candidate().row(), name, part.holds(name));
            }
        }
    }

    private Optional<PlannedRow> next(CandidateRows rows, RunLedger ledger, StopSignal stop)
            throws IOException {
        while (!stop.isAsked()) {
            Optional<ListedCandidate> row = rows.next();
            if (row.isEmpty()) {
                return Optional.empty();
            }
            Optional<PlannedEntry> planned = ledger.planned(row.get().candidate().row());
            if (planned.isPresent()) {
                return Optional.of(new PlannedRow(row.get(), planned.get()));
            }
        }
        return Optional.empty();
    }

    private Outcome outcome(PlannedRow row, SurveyRunner runner) throws IOException {
        Optional<PlannedEntry.Done> done = row.planned().done();
        if (done.isPresent() && isUnchanged(row, done.get())) {
            return new Outcome(
                    row.listed().candidate().name(), done.get().status(), "", Optional.empty());
        }
        long start = System.nanoTime();
        return runner.output(
                row.listed(),
                source.folder(),
                result ->
                        chain.times()
                                .timed(
                                        Stage.WRITE,
                                        () -> written(result, row.planned().stem(), start)));
    }

    private boolean isUnchanged(PlannedRow row, PlannedEntry.Done done) throws IOException {
        return row.listed().problem().isEmpty()
                && folder.holds(row.planned().stem(), done)
                && key(row.listed().candidate().name(), inputs.of(row.listed().candidate()))
                        .equals(done.inputSha256());
    }

    /** The checksum of the inputs of an object, with the observer's verdict where there is one. */
    private String key(String name, String inputs) {
        return verdicts.of(name)
                .map(verdict -> (inputs + " " + verdict).getBytes(StandardCharsets.UTF_8))
                .map(bytes -> Checksum.of(bytes))
                .orElse(inputs);
    }

    private Outcome written(ObjectResult measured, String stem, long start) throws IOException {
        double seconds = (System.nanoTime() - start) * 1e-9;
        String name = measured.candidate().name();
        ObjectResult result = measured.withVerdict(verdicts.of(name));
        ObjectEntry entry = folder.write(result, stem, key(name, inputs.of(measured)), seconds);
        return new Outcome(
                result.candidate().name(),
                result.status().word(),
                result.reason(),
                Optional.of(entry));
    }

    private void take(Outcome outcome, RunLedger ledger, Progress progress) throws LedgerException {
        if (outcome.entry().isPresent()) {
            ObjectEntry entry = outcome.entry().get();
            chain.times()
                    .timed(
                            Stage.WRITE,
                            () -> {
                                ledger.record(entry);
                                return entry;
                            });
            if (outcome.status().equals(Status.FAILED.word())) {
                progress.say(outcome.name() + ": failed: " + outcome.reason());
            }
        }
        progress.step();
    }

    private Ending ended(RunLedger ledger, Progress progress, long unchanged) throws IOException {
        ledger.commit();
        RunProgress now = ledger.progress();
        boolean complete = now.done() == now.objects();
        chain.times()
                .timed(
                        Stage.WRITE,
                        () -> {
                            folder.finish(ledger, identity, source.name());
                            return complete;
                        });
        long left = folder.leftovers(ledger);
        if (left > 0) {
            progress.say(
                    out
                            + ": holds "
                            + left
                            + " files of objects of an earlier run, which are not in this list;"
                            + " remove them, or give each list a folder of its own");
        }
        ledger.end(complete);
        return new Ending(now, unchanged, complete);
    }

    /** What is done while a ledger is open. */
    @FunctionalInterface
    private interface Body {
        Ending done() throws IOException, InterruptedException;
    }

    /** Does it; where it fails, keeps what was recorded and says how far it came. */
    private Ending kept(RunLedger ledger, Body body) throws IOException, InterruptedException {
        try {
            return body.done();
        } catch (IOException e) {
            if (!OutputTrouble.isDiskFull(e)) {
                throw e;
            }
            throw new RunRefusedException(full(ledger), e);
        }
    }

    private String full(RunLedger ledger) {
        String kept = "what was recorded is kept";
        try {
            ledger.end(false);
            RunProgress now = ledger.progress();
            kept = now.done() + " of " + now.objects() + " objects are done and kept";
        } catch (LedgerException e) {
            kept = "what was recorded before is kept";
        }
        return out
                + ": the disk is full; "
                + kept
                + ". Make space, then run the same command again: it goes on from there.";
    }
}
