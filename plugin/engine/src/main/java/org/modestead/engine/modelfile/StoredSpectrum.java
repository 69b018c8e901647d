package org.modestead.engine.modelfile;

import java.util.List;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;
import org.modestead.engine.spectrum.Spectrum;

/** A spectrum: eigenpairs and weights as complex arrays, modes one by one. */
public final class StoredSpectrum {

    private StoredSpectrum() {}

    /** Returns the tree of a spectrum. */
    public static Stored.Fields of(Spectrum spectrum) {
        List<Complex> weights = spectrum.modes().stream().flatMap(mode -> mode.weights().stream()).toList();
        return new FieldsWriter().list("channels", spectrum.channels(), StoredSnapshots::of).put("delay", StoredSnapshots.of(spectrum.delay()))
                .put("preparation", StoredSnapshots.of(spectrum.preparation())).text("time_unit", spectrum.timeUnit())
                .complexVector("eigenvalues", spectrum.eigenvalues()).complexVector("rates", spectrum.rates())
                .complexMatrix("vectors", spectrum.vectors()).complexMatrix("joint", spectrum.joint()).complexMatrix("solo", spectrum.solo())
                .list("modes", spectrum.modes(), StoredSpectrum::of).complexVector("weights", weights)
                .list("doubts", spectrum.doubts(), StoredSnapshots::of).done();
    }

    /** Returns the spectrum of a tree. */
    public static Spectrum read(FieldsReader in) {
        List<Channel> channels = in.objects("channels", StoredSnapshots::readChannel);
        DelayEmbedding delay = in.object("delay", StoredSnapshots::readDelay);
        List<Complex> rates = in.complexVector("rates");
        List<Complex> eigenvalues = in.complexVector("eigenvalues");
        if (eigenvalues.size() != rates.size()) {
            throw in.wrong("eigenvalues", eigenvalues.size() + " numbers", rates.size() + " numbers");
        }
        int rank = rates.size();
        int stateSize = Math.multiplyExact(channels.size(), delay.depth());
        List<Complex> weights = in.complexVector("weights");
        int[] taken = {0};
        List<Mode> modes = in.objects("modes", own -> mode(own, rank, weights, taken));
        return new Spectrum(eigenvalues, rates, in.complexMatrix("vectors", rank, rank), in.complexMatrix("joint", rank, stateSize),
                in.complexMatrix("solo", rank, stateSize), modes, channels, delay,
                in.object("preparation", own -> StoredSnapshots.readPreparation(own, channels.size())), in.text("time_unit"),
                in.objects("doubts", StoredSnapshots::readDoubt));
    }

    private static Stored.Fields of(Mode mode) {
        return new FieldsWriter().whole("number", mode.number()).wholes("indices", mode.indices()).complex("rate", mode.rate())
                .number("amplitude", mode.amplitude()).number("energy_share", mode.energyShare()).number("joint_solo_gap", mode.jointSoloGap())
                .whole("weights", mode.weights().size()).flag("constant", mode.constant()).whole("cluster", mode.cluster())
                .put("intervals", mode.intervals(), StoredSpectrum::of).done();
    }

    /** The weights of all modes stand one after the other. */
    private static Mode mode(FieldsReader in, int rank, List<Complex> weights, int[] taken) {
        int count = in.count("weights", 0, weights.size() - taken[0]);
        List<Complex> own = weights.subList(taken[0], taken[0] + count);
        taken[0] += count;
        return new Mode(in.count("number", 1, Integer.MAX_VALUE), in.wholes("indices", 0, rank - 1), in.complex("rate"), in.number("amplitude"),
                in.number("energy_share"), in.number("joint_solo_gap"), own, in.flag("constant"), in.count("cluster", 0, rank),
                in.optional("intervals", StoredSpectrum::intervals));
    }

    private static Stored.Fields of(ModeIntervals intervals) {
        return new FieldsWriter().number("level", intervals.level()).put("growth", of(intervals.growth())).put("turning", of(intervals.turning()))
                .put("damping_ratio", of(intervals.dampingRatio())).put("amplitude", of(intervals.amplitude())).done();
    }

    private static ModeIntervals intervals(FieldsReader in) {
        return new ModeIntervals(in.number("level"), in.object("growth", StoredSpectrum::interval), in.object("turning", StoredSpectrum::interval),
                in.object("damping_ratio", StoredSpectrum::interval), in.object("amplitude", StoredSpectrum::interval));
    }

    private static Stored.Fields of(Interval interval) {
        return new FieldsWriter().number("low", interval.low()).number("high", interval.high()).done();
    }

    private static Interval interval(FieldsReader in) {
        return new Interval(in.number("low"), in.number("high"));
    }
}
