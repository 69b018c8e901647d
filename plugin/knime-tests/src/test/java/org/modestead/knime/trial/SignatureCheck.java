package org.modestead.knime.trial;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.modestead.knime.trial.ClassPool.Member;
import org.modestead.knime.trial.ClassPool.Shape;
import org.objectweb.asm.ClassReader;
import org.objectweb.asm.Opcodes;

/**
 * Compares what our byte code uses of the platform with the platform's own class files, by descriptor, as a JVM would when it links
 * the two (Java Virtual Machine Specification, 5.4.3), and tells what would fail then.
 */
final class SignatureCheck {

    private final ClassPool ours;
    private final ClassPool platform;
    private final ClassPool both;

    SignatureCheck(ClassPool ours, ClassPool platform) {
        this.ours = ours;
        this.platform = platform;
        this.both = ours.with(platform);
    }

    /**
     * What came out.
     *
     * @param classes of the platform that were looked up
     * @param members of the platform that were looked up
     * @param problems one sentence each
     */
    record Outcome(int classes, int members, List<String> problems) {}

    /** Compares every use, every overriding method, and every abstract method that must be there. */
    Outcome compare() {
        PlatformUses uses = new PlatformUses();
        ours.names().forEach(name -> ours.file(name).accept(uses, ClassReader.SKIP_DEBUG | ClassReader.SKIP_FRAMES));
        List<String> problems = new ArrayList<>();
        for (String name : uses.classes()) {
            Optional<Shape> shape = platform.shape(name);
            if (shape.isEmpty()) {
                problems.add("no class " + name.replace('/', '.'));
            } else if (!shape.get().is(Opcodes.ACC_PUBLIC) && !name.contains("$")) {
                problems.add("class " + name.replace('/', '.') + " is not public");
            }
        }
        uses.members().forEach(use -> problem(use).ifPresent(problems::add));
        ours.names().forEach(name -> inherited(name, problems));
        return new Outcome(uses.classes().size(), uses.members().size(), problems);
    }

    private Optional<String> problem(PlatformUses.Use use) {
        Optional<Shape> owner = platform.shape(use.owner());
        if (owner.isEmpty()) {
            return Optional.of("no class for " + use);
        }
        boolean method = use.kind() == PlatformUses.Kind.METHOD || use.kind() == PlatformUses.Kind.STATIC_METHOD;
        if (method && owner.get().is(Opcodes.ACC_INTERFACE) != use.ofInterface()) {
            return Optional.of((use.ofInterface() ? "a class, no interface: " : "an interface, no class: ") + use);
        }
        Optional<Member> member = find(use, method);
        if (member.isEmpty()) {
            return Optional.of("no such member: " + use);
        } else if (!member.get().is(Opcodes.ACC_PUBLIC | Opcodes.ACC_PROTECTED)) {
            return Optional.of("not accessible: " + use);
        }
        boolean isStatic = use.kind() == PlatformUses.Kind.STATIC_METHOD || use.kind() == PlatformUses.Kind.STATIC_FIELD;
        return member.get().is(Opcodes.ACC_STATIC) == isStatic ? Optional.empty()
                : Optional.of((isStatic ? "not static: " : "static: ") + use);
    }

    private Optional<Member> find(PlatformUses.Use use, boolean method) {
        List<Shape> lineage = use.name().equals("<init>") ? platform.shape(use.owner()).stream().toList()
                : new ArrayList<>(platform.lineage(use.owner()));
        if (use.ofInterface()) { // an interface's methods are asked of Object too
            platform.shape("java/lang/Object").ifPresent(lineage::add);
        }
        String signature = use.name() + use.descriptor();
        return lineage.stream().map(shape -> Optional.ofNullable((method ? shape.methods() : shape.fields()).get(signature)))
                .flatMap(Optional::stream).findFirst();
    }

    /** Looks at a class of ours that inherits from the platform: what it may not override, what it must bring. */
    private void inherited(String name, List<String> problems) {
        String shown = name.replace('/', '.');
        List<Shape> lineage = both.lineage(name);
        Shape shape = lineage.get(0);
        Set<String> brought = new TreeSet<>();
        lineage.forEach(parent -> parent.methods().values().stream()
                .filter(method -> !method.is(Opcodes.ACC_ABSTRACT | Opcodes.ACC_STATIC | Opcodes.ACC_PRIVATE))
                .forEach(method -> brought.add(method.signature())));
        for (Shape parent : lineage.stream().filter(candidate -> candidate.name().startsWith(PlatformUses.PLATFORM)).toList()) {
            if (parent.is(Opcodes.ACC_FINAL)) {
                problems.add(shown + " extends the final " + parent.name().replace('/', '.'));
            }
            for (Member method : parent.methods().values()) {
                if (method.is(Opcodes.ACC_FINAL) && !method.is(Opcodes.ACC_PRIVATE) && shape.methods().containsKey(method.signature())) {
                    problems.add(shown + " overrides the final " + parent.name().replace('/', '.') + "." + method.signature());
                } else if (method.is(Opcodes.ACC_ABSTRACT) && !shape.is(Opcodes.ACC_ABSTRACT) && !brought.contains(method.signature())) {
                    problems.add(shown + " lacks " + parent.name().replace('/', '.') + "." + method.signature());
                }
            }
        }
    }
}
