package org.modestead.engine.spectrum;

import java.util.Arrays;
import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.jgrapht.Graph;
import org.jgrapht.alg.matching.KuhnMunkresMinimalWeightBipartitePerfectMatching;
import org.jgrapht.graph.DefaultWeightedEdge;
import org.jgrapht.graph.SimpleWeightedGraph;

/**
 * Pairs two lists at the smallest total cost (optimal assignment, Kuhn 1955, Munkres 1957). To be left unmatched costs twice what is too far,
 * and no pair costs more.
 *
 * <p>Mostly nothing has to be weighed: the nearest columns of all rows differ, or the nearest rows of all columns do. No assignment
 * can cost less than these, and only where that fails is one searched for.
 */
public final class Matching {

    private Matching() {}

    /**
     * @param cost rows x columns, finite, at least 0
     * @param tooFar pairs costlier than this are left unmatched
     * @return for every row the column it is matched to, -1 for none
     */
    public static int[] of(double[][] cost, double tooFar) {
        int rows = cost.length;
        int columns = rows == 0 ? 0 : cost[0].length;
        if (rows == 0 || columns == 0) {
            return unmatched(rows);
        }
        return nearest(cost, tooFar).or(() -> nearest(transposed(cost), tooFar).map(matched -> inverse(matched, rows)))
                .orElseGet(() -> searched(cost, tooFar));
    }

    /** Returns the nearest column of every row; empty where two rows share it or a row has two of them. */
    private static Optional<int[]> nearest(double[][] cost, double tooFar) {
        int[] matched = unmatched(cost.length);
        boolean[] taken = new boolean[cost[0].length];
        for (int i = 0; i < cost.length; i++) {
            int best = nearest(cost[i]);
            double least = cost[i][best];
            if (least >= 2 * tooFar) {
                continue;
            }
            if (taken[best] || Arrays.stream(cost[i]).filter(one -> one == least).count() > 1) {
                return Optional.empty();
            }
            taken[best] = true;
            matched[i] = least <= tooFar ? best : -1;
        }
        return Optional.of(matched);
    }

    private static int nearest(double[] costs) {
        int best = 0;
        for (int j = 1; j < costs.length; j++) {
            best = costs[j] < costs[best] ? j : best;
        }
        return best;
    }

    private static double[][] transposed(double[][] a) {
        double[][] out = new double[a[0].length][a.length];
        for (int i = 0; i < a.length; i++) {
            for (int j = 0; j < out.length; j++) {
                out[j][i] = a[i][j];
            }
        }
        return out;
    }

    /** From the row of every column to the column of every row. */
    private static int[] inverse(int[] matched, int rows) {
        int[] out = unmatched(rows);
        for (int j = 0; j < matched.length; j++) {
            if (matched[j] >= 0) {
                out[matched[j]] = j;
            }
        }
        return out;
    }

    private static int[] unmatched(int rows) {
        int[] matched = new int[rows];
        Arrays.fill(matched, -1);
        return matched;
    }

    private static int[] searched(double[][] cost, double tooFar) {
        int rows = cost.length;
        int columns = cost[0].length;
        int[] matched = unmatched(rows);
        int size = Math.max(rows, columns);
        Graph<Integer, DefaultWeightedEdge> graph = new SimpleWeightedGraph<>(DefaultWeightedEdge.class);
        Set<Integer> left = new HashSet<>();
        Set<Integer> right = new HashSet<>();
        for (int i = 0; i < size; i++) {
            graph.addVertex(i);
            graph.addVertex(size + i);
            left.add(i);
            right.add(size + i);
        }
        Map<DefaultWeightedEdge, int[]> ends = new HashMap<>();
        for (int i = 0; i < size; i++) {
            for (int j = 0; j < size; j++) {
                DefaultWeightedEdge edge = graph.addEdge(i, size + j);
                boolean real = i < rows && j < columns;
                graph.setEdgeWeight(edge, real ? Math.min(cost[i][j], 2 * tooFar) : 2 * tooFar);
                ends.put(edge, new int[] {i, j});
            }
        }
        for (DefaultWeightedEdge edge : new KuhnMunkresMinimalWeightBipartitePerfectMatching<>(graph, left, right).getMatching().getEdges()) {
            int[] pair = ends.get(edge);
            if (pair[0] < rows && pair[1] < columns && cost[pair[0]][pair[1]] <= tooFar) {
                matched[pair[0]] = pair[1];
            }
        }
        return matched;
    }
}
