package org.knime.core.node.workflow;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class VariableType<T> {

    protected abstract static class DefaultVariableType<T> extends VariableType<T> {
    }

    public static final class BooleanType extends DefaultVariableType<Boolean> {
        public static final BooleanType INSTANCE = null;

        private BooleanType() {
            throw new UnsupportedOperationException();
        }
    }

    public static final class DoubleType extends DefaultVariableType<Double> {
        public static final DoubleType INSTANCE = null;

        private DoubleType() {
            throw new UnsupportedOperationException();
        }
    }

    public static final class DoubleArrayType extends DefaultVariableType<Double[]> {
        public static final DoubleArrayType INSTANCE = null;

        private DoubleArrayType() {
            throw new UnsupportedOperationException();
        }
    }

    public static final class LongType extends DefaultVariableType<Long> {
        public static final LongType INSTANCE = null;

        private LongType() {
            throw new UnsupportedOperationException();
        }
    }

    public static final class StringType extends DefaultVariableType<String> {
        public static final StringType INSTANCE = null;

        private StringType() {
            throw new UnsupportedOperationException();
        }
    }

    public static final class StringArrayType extends DefaultVariableType<String[]> {
        public static final StringArrayType INSTANCE = null;

        private StringArrayType() {
            throw new UnsupportedOperationException();
        }
    }
}
