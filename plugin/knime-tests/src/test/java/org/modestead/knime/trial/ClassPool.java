package org.modestead.knime.trial;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.Collection;
import java.util.Deque;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import org.objectweb.asm.ClassReader;
import org.objectweb.asm.ClassVisitor;
import org.objectweb.asm.FieldVisitor;
import org.objectweb.asm.MethodVisitor;
import org.objectweb.asm.Opcodes;

/** Class files by internal name ({@code a/b/C}): some read from jars and folders, those of the JDK on demand. Nothing is loaded or run. */
final class ClassPool {

    private final Map<String, byte[]> files;
    private final Map<String, Optional<Shape>> shapes = new HashMap<>();

    private ClassPool(Map<String, byte[]> files) {
        this.files = files;
    }

    /**
     * A method or field as declared.
     *
     * @param access flags of {@link Opcodes}
     * @param name of the member
     * @param descriptor of the member
     */
    record Member(int access, String name, String descriptor) {
        boolean is(int flag) {
            return (access & flag) != 0;
        }

        /** Returns name and descriptor together. */
        String signature() {
            return name + descriptor;
        }
    }

    /**
     * What other classes see of a class.
     *
     * @param access flags of {@link Opcodes}
     * @param name internal name
     * @param parents superclass, if any, then interfaces
     * @param methods by name and descriptor
     * @param fields by name and descriptor
     */
    record Shape(int access, String name, List<String> parents, Map<String, Member> methods, Map<String, Member> fields) {
        boolean is(int flag) {
            return (access & flag) != 0;
        }
    }

    /** Reads all class files below folders and in jars, those in jars inside them too. */
    static ClassPool read(Collection<Path> places) throws IOException {
        Map<String, byte[]> files = new LinkedHashMap<>();
        for (Path place : places) {
            if (Files.isDirectory(place)) {
                try (Stream<Path> below = Files.walk(place)) {
                    for (Path file : below.filter(Files::isRegularFile).sorted().toList()) {
                        take(place.relativize(file).toString().replace('\\', '/'), Files.readAllBytes(file), files);
                    }
                }
            } else {
                take(place.toString(), Files.readAllBytes(place), files);
            }
        }
        return new ClassPool(files);
    }

    private static void take(String name, byte[] bytes, Map<String, byte[]> files) throws IOException {
        if (name.endsWith(".class")) {
            files.putIfAbsent(name.substring(0, name.length() - ".class".length()), bytes);
        } else if (name.endsWith(".jar")) {
            try (ZipInputStream zip = new ZipInputStream(new ByteArrayInputStream(bytes))) {
                for (ZipEntry entry = zip.getNextEntry(); entry != null; entry = zip.getNextEntry()) {
                    take(entry.getName(), zip.readAllBytes(), files);
                }
            }
        }
    }

    /** Returns a pool of these classes and those of another one. */
    ClassPool with(ClassPool other) {
        Map<String, byte[]> joined = new LinkedHashMap<>(files);
        other.files.forEach(joined::putIfAbsent);
        return new ClassPool(joined);
    }

    /** Returns the names of all classes that were read, in order. */
    List<String> names() {
        return List.copyOf(files.keySet());
    }

    /** Returns the class file of a class that was read. */
    ClassReader file(String name) {
        return new ClassReader(files.get(name));
    }

    /** Returns a class that was read or is of the JDK. */
    Optional<Shape> shape(String name) {
        Optional<Shape> known = shapes.get(name);
        if (known == null) {
            known = bytes(name).map(ClassPool::shape);
            shapes.put(name, known);
        }
        return known;
    }

    private Optional<byte[]> bytes(String name) {
        if (files.containsKey(name)) {
            return Optional.of(files.get(name));
        } else if (!name.startsWith("java")) {
            return Optional.empty();
        }
        try (InputStream in = ClassLoader.getSystemResourceAsStream(name + ".class")) {
            return in == null ? Optional.empty() : Optional.of(in.readAllBytes());
        } catch (IOException unreadable) {
            return Optional.empty();
        }
    }

    private static Shape shape(byte[] file) {
        ClassReader reader = new ClassReader(file);
        Map<String, Member> methods = new LinkedHashMap<>();
        Map<String, Member> fields = new LinkedHashMap<>();
        reader.accept(new ClassVisitor(Opcodes.ASM9) {
            @Override
            public MethodVisitor visitMethod(int access, String name, String descriptor, String signature, String[] exceptions) {
                methods.put(name + descriptor, new Member(access, name, descriptor));
                return null;
            }

            @Override
            public FieldVisitor visitField(int access, String name, String descriptor, String signature, Object value) {
                fields.put(name + descriptor, new Member(access, name, descriptor));
                return null;
            }
        }, ClassReader.SKIP_CODE | ClassReader.SKIP_DEBUG | ClassReader.SKIP_FRAMES);
        List<String> parents = Stream.concat(Stream.ofNullable(reader.getSuperName()), Stream.of(reader.getInterfaces())).toList();
        return new Shape(reader.getAccess(), reader.getClassName(), parents, methods, fields);
    }

    /** Returns a class and all that it inherits from, nearest first; what is not in the pool is left out. */
    List<Shape> lineage(String name) {
        Map<String, Shape> found = new LinkedHashMap<>();
        Deque<String> open = new ArrayDeque<>(List.of(name));
        while (!open.isEmpty()) {
            String next = open.removeFirst();
            if (!found.containsKey(next)) {
                shape(next).ifPresent(shape -> {
                    found.put(next, shape);
                    open.addAll(shape.parents());
                });
            }
        }
        return List.copyOf(found.values());
    }
}
