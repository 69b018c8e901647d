package org.modestead.knime.trial;

import java.util.Comparator;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.objectweb.asm.ClassVisitor;
import org.objectweb.asm.FieldVisitor;
import org.objectweb.asm.Handle;
import org.objectweb.asm.Label;
import org.objectweb.asm.MethodVisitor;
import org.objectweb.asm.Opcodes;
import org.objectweb.asm.Type;

/** Collects from class files what they use of the platform: its classes, methods and fields. */
final class PlatformUses extends ClassVisitor {

    /** How the internal names of the platform's classes begin. */
    static final String PLATFORM = "org/knime/";

    private final Set<String> classes = new TreeSet<>();
    private final Set<Use> members = new TreeSet<>(Comparator.comparing(Use::toString));

    PlatformUses() {
        super(Opcodes.ASM9);
    }

    /** Which kind of member, and how it is reached. */
    enum Kind {
        METHOD, STATIC_METHOD, FIELD, STATIC_FIELD
    }

    /**
     * One member as byte code names it.
     *
     * @param kind of member
     * @param owner internal name of the class that it is asked of
     * @param name of the member
     * @param descriptor of the member
     * @param ofInterface whether byte code takes the owner for an interface; methods only
     */
    record Use(Kind kind, String owner, String name, String descriptor, boolean ofInterface) {
        @Override
        public String toString() {
            return owner.replace('/', '.') + "." + name + " " + descriptor + " (" + kind + (ofInterface ? " of an interface)" : ")");
        }
    }

    /** Returns internal names. */
    Set<String> classes() {
        return classes;
    }

    Set<Use> members() {
        return members;
    }

    private void type(Type type) {
        switch (type.getSort()) {
            case Type.ARRAY -> type(type.getElementType());
            case Type.OBJECT -> named(type.getInternalName());
            case Type.METHOD -> {
                type(type.getReturnType());
                for (Type argument : type.getArgumentTypes()) {
                    type(argument);
                }
            }
            default -> { }
        }
    }

    private void named(String internalName) {
        if (internalName != null && internalName.startsWith(PLATFORM)) {
            classes.add(internalName);
        } else if (internalName != null && internalName.startsWith("[")) {
            type(Type.getType(internalName));
        }
    }

    private void member(Kind kind, String owner, String name, String descriptor, boolean ofInterface) {
        named(owner);
        type(Type.getType(descriptor));
        if (owner.startsWith(PLATFORM)) {
            members.add(new Use(kind, owner, name, descriptor, ofInterface));
        }
    }

    private void handle(Handle handle) {
        boolean field = handle.getTag() <= Opcodes.H_PUTSTATIC;
        boolean isStatic = handle.getTag() == Opcodes.H_INVOKESTATIC || handle.getTag() == Opcodes.H_GETSTATIC;
        Kind kind = field ? (isStatic ? Kind.STATIC_FIELD : Kind.FIELD) : isStatic ? Kind.STATIC_METHOD : Kind.METHOD;
        member(kind, handle.getOwner(), handle.getName(), handle.getDesc(), handle.isInterface());
    }

    @Override
    public void visit(int version, int access, String name, String signature, String superName, String[] interfaces) {
        named(superName);
        for (String parent : interfaces) {
            named(parent);
        }
    }

    @Override
    public FieldVisitor visitField(int access, String name, String descriptor, String signature, Object value) {
        type(Type.getType(descriptor));
        return null;
    }

    @Override
    public MethodVisitor visitMethod(int access, String name, String descriptor, String signature, String[] exceptions) {
        type(Type.getType(descriptor));
        if (exceptions != null) {
            Stream.of(exceptions).forEach(PlatformUses.this::named);
        }
        return new Code();
    }

    private final class Code extends MethodVisitor {
        Code() {
            super(Opcodes.ASM9);
        }

        @Override
        public void visitMethodInsn(int opcode, String owner, String name, String descriptor, boolean isInterface) {
            if (owner.startsWith("[")) {
                named(owner);
            } else {
                member(opcode == Opcodes.INVOKESTATIC ? Kind.STATIC_METHOD : Kind.METHOD, owner, name, descriptor, isInterface);
            }
        }

        @Override
        public void visitFieldInsn(int opcode, String owner, String name, String descriptor) {
            boolean isStatic = opcode == Opcodes.GETSTATIC || opcode == Opcodes.PUTSTATIC;
            member(isStatic ? Kind.STATIC_FIELD : Kind.FIELD, owner, name, descriptor, false);
        }

        @Override
        public void visitTypeInsn(int opcode, String type) {
            named(type);
        }

        @Override
        public void visitLdcInsn(Object value) {
            argument(value);
        }

        @Override
        public void visitTryCatchBlock(Label start, Label end, Label handler, String type) {
            named(type);
        }

        @Override
        public void visitInvokeDynamicInsn(String name, String descriptor, Handle bootstrap, Object... arguments) {
            type(Type.getType(descriptor));
            for (Object argument : arguments) {
                argument(argument);
            }
        }

        private void argument(Object value) {
            if (value instanceof Type type) {
                type(type);
            } else if (value instanceof Handle handle) {
                handle(handle);
            }
        }
    }
}
