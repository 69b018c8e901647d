package org.modestead.knime.view;

import java.awt.BorderLayout;
import java.awt.Component;
import java.awt.KeyboardFocusManager;
import java.util.List;
import javax.swing.BorderFactory;
import javax.swing.JPanel;
import javax.swing.JTable;
import javax.swing.SwingConstants;
import javax.swing.table.DefaultTableCellRenderer;
import javax.swing.table.DefaultTableModel;
import javax.swing.table.TableColumn;

/** A small table of texts with its head, as high as its rows. */
final class GridTable {
    private static final int WIDEST = 420;
    private static final int PAD = 12;

    private GridTable() {}

    /**
     * @param name what it shows, for a reader of screens
     * @param heads of the columns
     * @param right whether the cells of a column are figures, to be aligned at the right
     * @param rows cells
     */
    static JPanel of(String name, List<String> heads, List<Boolean> right, List<List<String>> rows) {
        DefaultTableModel model = new DefaultTableModel(rows.stream().map(List::toArray).toArray(Object[][]::new), heads.toArray()) {
            private static final long serialVersionUID = 1L;

            @Override
            public boolean isCellEditable(int row, int column) {
                return false;
            }
        };
        JTable table = new JTable(model);
        table.setFocusTraversalKeys(KeyboardFocusManager.FORWARD_TRAVERSAL_KEYS, null);
        table.setFocusTraversalKeys(KeyboardFocusManager.BACKWARD_TRAVERSAL_KEYS, null);
        table.getAccessibleContext().setAccessibleName(name);
        for (int j = 0; j < heads.size(); j++) {
            DefaultTableCellRenderer renderer = new DefaultTableCellRenderer();
            renderer.putClientProperty("html.disable", Boolean.TRUE);
            renderer.setHorizontalAlignment(right.get(j) ? SwingConstants.RIGHT : SwingConstants.LEADING);
            TableColumn column = table.getColumnModel().getColumn(j);
            column.setCellRenderer(renderer);
            column.setPreferredWidth(width(table, j));
        }
        JPanel panel = new JPanel(new BorderLayout());
        panel.setBorder(BorderFactory.createEmptyBorder(2, 8, 8, 8));
        panel.add(table.getTableHeader(), BorderLayout.PAGE_START);
        panel.add(table, BorderLayout.CENTER);
        return panel;
    }

    private static int width(JTable table, int column) {
        Component head = table.getTableHeader().getDefaultRenderer().getTableCellRendererComponent(table, table.getColumnName(column), false,
                false, -1, column);
        int widest = head.getPreferredSize().width;
        for (int i = 0; i < table.getRowCount(); i++) {
            widest = Math.max(widest, table.prepareRenderer(table.getCellRenderer(i, column), i, column).getPreferredSize().width);
        }
        return Math.min(WIDEST, widest + PAD);
    }
}
