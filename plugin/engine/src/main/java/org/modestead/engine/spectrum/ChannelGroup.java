package org.modestead.engine.spectrum;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.linalg.Complex;

/**
 * Channels that belong together, such as those of one bearing.
 *
 * @param name for people
 * @param channels 0-based, at least one, rising
 */
public record ChannelGroup(String name, List<Integer> channels) {

    /** Takes an immutable copy. */
    public ChannelGroup {
        channels = List.copyOf(channels);
        if (channels.isEmpty()) {
            throw new IllegalArgumentException("group " + name + " has no channel");
        }
    }

    /**
     * How a group moves in a mode, in prepared units so that channels of different quantities can be added up.
     *
     * @param group which
     * @param energyShare sum of the squared magnitudes of its channels over that of all channels, in [0, 1]
     * @param magnitude root mean square of the magnitudes of its channels, relative to the largest magnitude of all channels, in [0, 1]
     * @param phase of the mean of its channels in radians in (-π, π], against the channel that moves most
     * @param inStep size of that mean over the root mean square, in [0, 1]: 1 when its channels move alike, 0 when they cancel and the
     *     phase says nothing
     */
    public record Share(ChannelGroup group, double energyShare, double magnitude, double phase, double inStep) {}

    /**
     * Returns how every group moves in a mode.
     *
     * @param spectrum the mode's
     * @param mode one of it
     * @param groups of the spectrum's channels
     */
    public static List<Share> shares(Spectrum spectrum, Mode mode, List<ChannelGroup> groups) {
        List<Complex> shape = mode.weights().subList(0, spectrum.channels().size());
        double total = 0;
        Complex largest = Complex.ZERO;
        for (Complex weight : shape) {
            total += Math.pow(weight.abs(), 2);
            largest = weight.abs() > largest.abs() * (1 + 1e-9) ? weight : largest;
        }
        List<Share> shares = new ArrayList<>();
        for (ChannelGroup group : groups) {
            shares.add(share(group, shape, total, largest));
        }
        return shares;
    }

    private static Share share(ChannelGroup group, List<Complex> shape, double total, Complex largest) {
        double energy = 0;
        Complex mean = Complex.ZERO;
        for (int channel : group.channels()) {
            energy += Math.pow(shape.get(channel).abs(), 2);
            mean = mean.plus(shape.get(channel).times(1.0 / group.channels().size()));
        }
        double size = Math.sqrt(energy / group.channels().size());
        Complex turned = mean.times(largest.conj());
        return new Share(group, total > 0 ? energy / total : 0, total > 0 ? size / largest.abs() : 0, turned.arg() == -Math.PI ? Math.PI
                : turned.arg(), size > 0 ? Math.min(1, mean.abs() / size) : 0);
    }
}
