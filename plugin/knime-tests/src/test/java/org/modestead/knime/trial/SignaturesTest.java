package org.modestead.knime.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.knime.core.node.NodeModel;
import org.modestead.knime.DeclaredNodeFactory;
import org.modestead.knime.trial.ClassPool.Member;
import org.modestead.knime.trial.ClassPool.Shape;
import org.objectweb.asm.Opcodes;

/** Every class, method and field of the platform that the bridge's byte code uses is there, with the same descriptor. */
class SignaturesTest {

    /** The bundles that hold the packages which the bridge imports. */
    private static final List<String> CORE = List.of("org.knime.core", "org.knime.core.util");

    @Test
    void bridgeUsesOnlyWhatTheWrittenSignaturesHave() throws Exception {
        SignatureCheck.Outcome outcome = new SignatureCheck(bridge(), writtenSignatures()).compare();
        assertEquals(List.of(), outcome.problems());
        assertTrue(outcome.classes() > 20 && outcome.members() > 50, "looked at " + outcome);
    }

    @Test
    void bridgeUsesOnlyWhatTheRealBundlesHave() throws Exception {
        PlatformHome home = PlatformHome.givenOrSkipped();
        SignatureCheck.Outcome outcome = new SignatureCheck(bridge(), real(home)).compare();
        assertEquals(List.of(), outcome.problems());
        System.out.println("Signatures check against the real bundles: " + outcome.classes() + " classes and " + outcome.members()
                + " methods and fields of the platform are used by the bridge; all are there.");
    }

    /** What no byte code of ours uses today may be used tomorrow. */
    @Test
    void writtenSignaturesAreThoseOfTheRealBundles() throws Exception {
        ClassPool real = real(PlatformHome.givenOrSkipped());
        ClassPool written = writtenSignatures();
        List<String> problems = new ArrayList<>();
        int members = 0;
        for (String name : written.names()) {
            Shape shape = written.shape(name).orElseThrow();
            Optional<Shape> counterpart = real.shape(name);
            if (counterpart.isEmpty()) {
                problems.add("no class " + name);
                continue;
            }
            problems.addAll(differences(shape, counterpart.get()));
            for (Member member : shape.methods().values()) {
                members += visible(member) ? 1 : 0;
                compare(name, member, real.lineage(name).stream().map(parent -> Optional.ofNullable(parent.methods().get(member.signature())))
                        .flatMap(Optional::stream).findFirst()).ifPresent(problems::add);
            }
            for (Member member : shape.fields().values()) {
                members += visible(member) ? 1 : 0;
                compare(name, member, Optional.ofNullable(counterpart.get().fields().get(member.signature()))).ifPresent(problems::add);
            }
        }
        assertEquals(List.of(), problems);
        System.out.println("Written signatures against the real bundles: " + written.names().size() + " classes, " + members
                + " methods and fields; all are there.");
    }

    private static List<String> differences(Shape written, Shape real) {
        List<String> found = new ArrayList<>();
        for (int flag : new int[] {Opcodes.ACC_INTERFACE, Opcodes.ACC_ABSTRACT, Opcodes.ACC_FINAL, Opcodes.ACC_ENUM}) {
            if (written.is(flag) != real.is(flag) && !(flag == Opcodes.ACC_FINAL && real.is(Opcodes.ACC_ENUM))) {
                found.add(written.name() + " differs in flag " + flag);
            }
        }
        return found;
    }

    private static Optional<String> compare(String owner, Member written, Optional<Member> real) {
        if (!visible(written)) {
            return Optional.empty();
        } else if (real.isEmpty()) {
            return Optional.of("no " + owner + "." + written.signature());
        }
        boolean same = true;
        for (int flag : new int[] {Opcodes.ACC_PUBLIC, Opcodes.ACC_PROTECTED, Opcodes.ACC_STATIC, Opcodes.ACC_ABSTRACT}) {
            same &= written.is(flag) == real.get().is(flag);
        }
        return same ? Optional.empty() : Optional.of("other flags: " + owner + "." + written.signature());
    }

    /** Constructors without arguments are left to the byte code's check: a written class may have one because Java gives it one. */
    private static boolean visible(Member member) {
        return member.is(Opcodes.ACC_PUBLIC | Opcodes.ACC_PROTECTED) && !member.is(Opcodes.ACC_SYNTHETIC)
                && !member.signature().equals("<init>()V");
    }

    private static ClassPool bridge() throws IOException, URISyntaxException {
        return ClassPool.read(List.of(origin(DeclaredNodeFactory.class)));
    }

    private static ClassPool writtenSignatures() throws IOException, URISyntaxException {
        return ClassPool.read(List.of(origin(NodeModel.class)));
    }

    private static ClassPool real(PlatformHome home) throws IOException {
        return ClassPool.read(CORE.stream().map(home::bundle).toList());
    }

    private static Path origin(Class<?> type) throws URISyntaxException {
        return Path.of(type.getProtectionDomain().getCodeSource().getLocation().toURI());
    }
}
