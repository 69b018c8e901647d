package org.modestead.host.fault;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.modelfile.MomentFiles;
import org.modestead.nodes.modelfile.PortFiles;

/**
 * Files of models or of moments: the bytes of the zip changed, or a sound zip made of changed entries, among them entries that unpack to
 * thousands of times their size.
 */
final class ModelFuzz implements FuzzedReader {

    private static final int BOMB = 1 << 24;
    private final String name;
    private final List<byte[]> samples;
    private final Reading reading;

    private ModelFuzz(String name, List<byte[]> samples, Reading reading) {
        this.name = name;
        this.samples = List.copyOf(samples);
        this.reading = reading;
    }

    private interface Reading {
        void of(byte[] input) throws IOException;
    }

    /** A file in a zip. */
    record Entry(String name, byte[] bytes) {}

    /** Of the model files that are kept from each version of the format. */
    static ModelFuzz models() throws IOException {
        List<byte[]> samples = new ArrayList<>();
        try (Stream<Path> kept = Files.list(Path.of("../nodes/src/test/resources/org/modestead/nodes/modelfile"))) {
            for (Path file : kept.filter(path -> path.toString().endsWith(".zip")).sorted().toList()) {
                samples.add(Files.readAllBytes(file));
            }
        }
        return new ModelFuzz("models", samples, input -> {
            PortFiles.outlook(new ByteArrayInputStream(input));
            PortFiles.read(PortType.MODEL, new ByteArrayInputStream(input));
        });
    }

    /** Of a file of moments. */
    static ModelFuzz moments(byte[] sample) {
        return new ModelFuzz("moments", List.of(sample), input -> MomentFiles.read(new ByteArrayInputStream(input)));
    }

    @Override
    public String name() {
        return name;
    }

    @Override
    public byte[] next(Random random) {
        Mutations mutations = new Mutations(random);
        byte[] sample = samples.get(random.nextInt(samples.size()));
        if (random.nextInt(4) == 0) {
            return mutations.bits(random.nextBoolean() ? sample : java.util.Arrays.copyOf(sample, random.nextInt(sample.length)));
        }
        List<Entry> entries = entries(sample);
        for (int k = random.nextInt(2); k >= 0; k--) {
            change(entries, mutations, random);
        }
        return zip(entries);
    }

    private static void change(List<Entry> entries, Mutations mutations, Random random) {
        int at = random.nextInt(3) > 0 ? 0 : random.nextInt(entries.size());
        Entry entry = entries.get(at);
        switch (random.nextInt(12)) {
            case 0 -> entries.remove(at);
            case 1 -> entries.add(entry);
            case 2 -> entries.set(at, new Entry(mutations.word() + entry.name(), entry.bytes()));
            case 3 -> entries.set(at, new Entry(entry.name(), mutations.bits(entry.bytes())));
            case 4 -> entries.set(at, new Entry(entry.name(), random.nextInt(200) > 0 ? new byte[0] : new byte[BOMB]));
            default -> entries.set(at, new Entry(entry.name(), mutations.text(entry.bytes(), entry.bytes())));
        }
        if (entries.isEmpty()) {
            entries.add(entry);
        }
    }

    /** Unpacks a sound zip. */
    static List<Entry> entries(byte[] sample) {
        List<Entry> entries = new ArrayList<>();
        try (ZipInputStream zip = new ZipInputStream(new ByteArrayInputStream(sample))) {
            for (ZipEntry entry = zip.getNextEntry(); entry != null; entry = zip.getNextEntry()) {
                entries.add(new Entry(entry.getName(), zip.readAllBytes()));
            }
        } catch (IOException impossible) {
            throw new IllegalStateException(impossible);
        }
        return entries;
    }

    /** Names may be there twice, which a {@link ZipOutputStream} refuses: then the second one is left out. */
    static byte[] zip(List<Entry> entries) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        List<String> names = new ArrayList<>();
        try (ZipOutputStream zip = new ZipOutputStream(out)) {
            zip.setLevel(1);
            for (Entry entry : entries) {
                if (!names.contains(entry.name())) {
                    names.add(entry.name());
                    zip.putNextEntry(new ZipEntry(entry.name()));
                    zip.write(entry.bytes());
                }
            }
        } catch (IOException impossible) {
            throw new IllegalStateException(impossible);
        }
        return out.toByteArray();
    }

    @Override
    public boolean read(byte[] input) throws IOException {
        reading.of(input);
        return true;
    }
}
