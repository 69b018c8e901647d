package org.modestead.host.bench.server;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.host.table.TablePages;
import org.modestead.nodes.table.Table;

/** Tables at rest that were looked at last; the one unused for longest makes room. Thread-safe: a large table holds up no other. */
final class TableLooks implements AutoCloseable {

    private static final int MOST = 6;

    private final Map<String, TablePages> open = new LinkedHashMap<>(16, 0.75f, true);

    /** Returns a page of a table; the key names the table and what it was made from. */
    TablePages.Page page(String key, Table table, TablePages.Wish wish) {
        while (true) {
            Optional<TablePages.Page> page = pages(key, table).page(wish);
            if (page.isPresent()) {
                return page.get();
            }
        }
    }

    private TablePages pages(String key, Table table) {
        List<TablePages> leaving = new ArrayList<>();
        TablePages pages;
        synchronized (this) {
            pages = open.computeIfAbsent(key, made -> new TablePages(table));
            while (open.size() > MOST) {
                leaving.add(open.remove(open.keySet().iterator().next()));
            }
        }
        leaving.forEach(TablePages::close);
        return pages;
    }

    @Override
    public synchronized void close() {
        open.values().forEach(TablePages::close);
        open.clear();
    }
}
