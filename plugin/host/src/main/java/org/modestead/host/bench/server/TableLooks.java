package org.modestead.host.bench.server;

import java.util.LinkedHashMap;
import java.util.Map;
import org.modestead.host.table.TablePages;
import org.modestead.nodes.table.Table;

/** Tables at rest that were looked at last; the one unused for longest makes room. Thread-safe. */
final class TableLooks implements AutoCloseable {

    private static final int MOST = 6;

    private final Map<String, TablePages> open = new LinkedHashMap<>(16, 0.75f, true);

    /** Returns a page of a table; the key names the table and what it was made from. */
    synchronized TablePages.Page page(String key, Table table, TablePages.Wish wish) {
        TablePages pages = open.get(key);
        if (pages == null) {
            pages = TablePages.of(table);
            open.put(key, pages);
            while (open.size() > MOST) {
                String oldest = open.keySet().iterator().next();
                open.remove(oldest).close();
            }
        }
        return pages.page(wish);
    }

    @Override
    public synchronized void close() {
        open.values().forEach(TablePages::close);
        open.clear();
    }
}
