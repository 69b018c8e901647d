package org.modestead.knime.view;

import java.awt.BorderLayout;
import java.awt.Component;
import java.awt.Dimension;
import java.awt.KeyboardFocusManager;
import java.util.List;
import javax.swing.BorderFactory;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.JTable;
import javax.swing.SwingConstants;
import javax.swing.table.DefaultTableCellRenderer;
import javax.swing.table.DefaultTableModel;
import javax.swing.table.TableColumn;
import org.modestead.nodes.document.ReportDocument.Grid;

/** A small table of texts with its head, as high as its rows; one that is wider than the window scrolls sideways. */
final class GridTable {
    private static final int WIDEST = 420;
    private static final int PAD = 12;
    private static final int ROOM = 640;
    private static final int BAR = 18;

    private GridTable() {}

    static JPanel of(Grid grid) {
        DefaultTableModel model = new DefaultTableModel(grid.rows().stream().map(List::toArray).toArray(Object[][]::new),
                grid.columns().stream().map(head -> head.text()).toArray()) {
            private static final long serialVersionUID = 1L;

            @Override
            public boolean isCellEditable(int row, int column) {
                return false;
            }
        };
        JTable table = new JTable(model);
        table.setFocusTraversalKeys(KeyboardFocusManager.FORWARD_TRAVERSAL_KEYS, null);
        table.setFocusTraversalKeys(KeyboardFocusManager.BACKWARD_TRAVERSAL_KEYS, null);
        table.getAccessibleContext().setAccessibleName(grid.caption());
        int total = 0;
        for (int j = 0; j < grid.columns().size(); j++) {
            DefaultTableCellRenderer renderer = new DefaultTableCellRenderer();
            renderer.putClientProperty("html.disable", Boolean.TRUE);
            renderer.setHorizontalAlignment(grid.columns().get(j).numeric() ? SwingConstants.RIGHT : SwingConstants.LEADING);
            TableColumn column = table.getColumnModel().getColumn(j);
            column.setCellRenderer(renderer);
            column.setPreferredWidth(width(table, j));
            total += column.getPreferredWidth();
        }
        JPanel panel = new JPanel(new BorderLayout());
        panel.setBorder(BorderFactory.createEmptyBorder(2, 8, 8, 8));
        panel.add(total > ROOM ? wide(table) : narrow(table), BorderLayout.CENTER);
        return panel;
    }

    private static JPanel narrow(JTable table) {
        JPanel panel = new JPanel(new BorderLayout());
        panel.add(table.getTableHeader(), BorderLayout.PAGE_START);
        panel.add(table, BorderLayout.CENTER);
        return panel;
    }

    private static JScrollPane wide(JTable table) {
        table.setAutoResizeMode(JTable.AUTO_RESIZE_OFF);
        JScrollPane pane = new JScrollPane(table, JScrollPane.VERTICAL_SCROLLBAR_NEVER, JScrollPane.HORIZONTAL_SCROLLBAR_ALWAYS);
        pane.setColumnHeaderView(table.getTableHeader());
        pane.setWheelScrollingEnabled(false);
        Dimension size = new Dimension(0, table.getPreferredSize().height + table.getTableHeader().getPreferredSize().height + BAR);
        pane.setPreferredSize(size);
        pane.setMinimumSize(size);
        return pane;
    }

    private static int width(JTable table, int column) {
        Component head = table.getTableHeader().getDefaultRenderer().getTableCellRendererComponent(table, table.getColumnName(column),
                false, false, -1, column);
        int widest = head.getPreferredSize().width;
        for (int i = 0; i < table.getRowCount(); i++) {
            widest = Math.max(widest, table.prepareRenderer(table.getCellRenderer(i, column), i, column).getPreferredSize().width);
        }
        return Math.min(WIDEST, widest + PAD);
    }
}
