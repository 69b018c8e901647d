package org.modestead.engine.spectrum;

import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import org.jgrapht.Graph;
import org.jgrapht.alg.matching.KuhnMunkresMinimalWeightBipartitePerfectMatching;
import org.jgrapht.graph.DefaultWeightedEdge;
import org.jgrapht.graph.SimpleWeightedGraph;

/** Pairs two lists at the smallest total cost (optimal assignment, Kuhn 1955, Munkres 1957). */
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
        int[] matched = new int[rows];
        java.util.Arrays.fill(matched, -1);
        if (rows == 0 || columns == 0) {
            return matched;
        }
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
