package org.modestead.knime.display;

import java.awt.Component;
import java.awt.Dimension;
import java.awt.Graphics2D;
import java.awt.KeyboardFocusManager;
import java.awt.Robot;
import java.awt.event.KeyEvent;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.Callable;
import java.util.concurrent.FutureTask;
import java.util.stream.Stream;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JFrame;
import javax.swing.JLabel;
import javax.swing.JRadioButton;
import javax.swing.JTabbedPane;
import javax.swing.SwingUtilities;
import org.modestead.knime.dialog.SettingsForm;
import org.modestead.knime.testing.Painted;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.Setting;

/**
 * Opens the dialog of every node in a window of 800 x 600 on a real display and walks through it with the Tab key alone. Prints one
 * line a page; ends with an exception at the first fault. Run by {@link DisplayTest} in a machine of its own.
 */
public final class OnDisplay {
    private static final int MOST_STOPS = 200;
    private static final int PATIENCE = 200;
    private static final int MOMENT = 50;
    /** Letters are smoothed otherwise on a screen, and a caret blinks. */
    private static final double MOST_DIFFERENT = 0.05;

    private OnDisplay() {}

    /** Runs; no arguments. */
    public static void main(String[] arguments) {
        int fault = 1;
        try {
            for (Node node : NodeCatalog.load(List.of(Node.class.getClassLoader())).nodes()) {
                walk(node);
            }
            fault = 0;
        } catch (Exception told) {
            told.printStackTrace();
        } finally {
            System.exit(fault);
        }
    }

    private static void walk(Node node) throws Exception {
        SettingsForm form = now(() -> new SettingsForm(node));
        JFrame frame = now(() -> {
            JFrame made = new JFrame(node.declaration().title());
            made.add(form.component());
            form.load(Map.of(), Map.of());
            made.setUndecorated(true);
            made.setSize(new Dimension(800, 600));
            made.setVisible(true);
            return made;
        });
        JTabbedPane tabs = now(() -> Painted.shown(form.component()).stream().filter(JTabbedPane.class::isInstance)
                .map(JTabbedPane.class::cast)
                .findFirst().orElseGet(JTabbedPane::new));
        for (int tab = 0; tab < Math.max(1, tabs.getTabCount()); tab++) {
            int shown = tab;
            now(() -> {
                if (tabs.getTabCount() > 0) {
                    tabs.setSelectedIndex(shown);
                }
                form.component().validate();
                return true;
            });
            page(node, form, frame, tabs.getTabCount() > 0 ? tabs.getTitleAt(tab) : "");
        }
        now(() -> {
            frame.dispose();
            return true;
        });
    }

    private static void page(Node node, SettingsForm form, JFrame frame, String title) throws Exception {
        List<String> wanted = now(() -> labels(form.component()));
        List<JComponent> first = now(() -> Painted.shown(form.component()).stream().filter(JLabel.class::isInstance)
                .map(JLabel.class::cast).filter(label -> label.getLabelFor() != null && isNamed(node, label.getText()))
                .map(label -> (JComponent) label.getLabelFor()).toList());
        if (first.isEmpty()) {
            System.out.println(node.declaration().id() + " " + title + ": nothing to set");
            return;
        }
        focus(takesKeyboard(first.get(0)));
        Set<Component> stops = new LinkedHashSet<>();
        Component at = focused();
        while (at != null && stops.add(at) && stops.size() < MOST_STOPS) {
            at = tab(at);
        }
        List<Component> order = new ArrayList<>(stops);
        int before = -1;
        for (int i = 0; i < first.size(); i++) {
            int here = position(order, first.get(i));
            if (here <= before) {
                throw new IllegalStateException(node.declaration().id() + " " + title + ": Tab reaches " + wanted.get(i) + " at stop "
                        + here
                        + ", the field before it at " + before);
            }
            before = here;
        }
        seen(node, frame);
        System.out.println(node.declaration().id() + " " + title + ": " + first.size() + " fields, " + stops.size() + " stops");
    }

    /** Returns the part of a field that holds the keyboard: of buttons of one group the chosen one, of a typed list its text. */
    private static Component takesKeyboard(JComponent part) throws Exception {
        return now(() -> {
            if (part instanceof JComboBox<?> list && list.isEditable()) {
                return list.getEditor().getEditorComponent();
            } else if (part instanceof JRadioButton) {
                return Stream.of(part.getParent().getComponents()).filter(JRadioButton.class::isInstance).map(JRadioButton.class::cast)
                        .filter(JRadioButton::isSelected).findFirst().orElse((JRadioButton) part);
            }
            return part;
        });
    }

    private static int position(List<Component> order, JComponent part) throws Exception {
        return order.indexOf(takesKeyboard(part));
    }

    /** Presses Tab, and where a group of buttons or a table keeps it, says so by standing still. */
    private static Component tab(Component from) throws Exception {
        now(() -> {
            KeyboardFocusManager.getCurrentKeyboardFocusManager().dispatchEvent(new KeyEvent(from, KeyEvent.KEY_PRESSED,
                    System.currentTimeMillis(), 0, KeyEvent.VK_TAB, '\t'));
            return true;
        });
        for (int i = 0; i < PATIENCE && focused() == from; i++) {
            Thread.sleep(MOMENT);
        }
        return focused();
    }

    private static void focus(Component part) throws Exception {
        for (int i = 0; i < PATIENCE && focused() != part; i++) {
            now(part::requestFocusInWindow);
            Thread.sleep(MOMENT);
        }
        if (focused() != part) {
            throw new IllegalStateException("the window does not get the keyboard");
        }
    }

    private static Component focused() throws Exception {
        return now(() -> KeyboardFocusManager.getCurrentKeyboardFocusManager().getFocusOwner());
    }

    /** What stands on the screen is what painting without one gives: the pictures of the README do not lie. */
    private static void seen(Node node, JFrame frame) throws Exception {
        double share = 1;
        for (int i = 0; i < PATIENCE && share > MOST_DIFFERENT; i++) {
            Thread.sleep(i == 0 ? 0 : MOMENT);
            now(() -> {
                frame.getRootPane().paintImmediately(0, 0, frame.getWidth(), frame.getHeight());
                return true;
            });
            java.awt.Toolkit.getDefaultToolkit().sync();
            share = different(new Robot().createScreenCapture(frame.getBounds()), now(() -> painted(frame)));
        }
        if (share > MOST_DIFFERENT) {
            throw new IllegalStateException(node.declaration().id() + ": the screen differs from the painting in " + share
                    + " of the pixels");
        }
    }

    private static BufferedImage painted(JFrame frame) {
        BufferedImage image = new BufferedImage(frame.getWidth(), frame.getHeight(), BufferedImage.TYPE_INT_RGB);
        Graphics2D graphics = image.createGraphics();
        frame.getRootPane().printAll(graphics);
        graphics.dispose();
        return image;
    }

    private static double different(BufferedImage a, BufferedImage b) {
        int different = 0;
        for (int y = 0; y < a.getHeight(); y++) {
            for (int x = 0; x < a.getWidth(); x++) {
                different += (a.getRGB(x, y) & 0xffffff) == (b.getRGB(x, y) & 0xffffff) ? 0 : 1;
            }
        }
        return different / (double) (a.getWidth() * a.getHeight());
    }

    private static List<String> labels(JComponent component) {
        return Painted.shown(component).stream().filter(JLabel.class::isInstance).map(JLabel.class::cast)
                .filter(label -> label.getLabelFor() != null).map(JLabel::getText).toList();
    }

    private static boolean isNamed(Node node, String label) {
        return node.declaration().settings().stream().map(Setting::common).anyMatch(common -> label.startsWith(common.label()));
    }

    private static <T> T now(Callable<T> work) throws Exception {
        FutureTask<T> task = new FutureTask<>(work);
        SwingUtilities.invokeAndWait(task);
        return task.get();
    }
}
