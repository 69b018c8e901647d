package org.modestead.host.bench.trial;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Base64;
import java.util.List;
import java.util.Map;
import java.util.function.BooleanSupplier;
import java.util.function.Supplier;
import java.util.logging.Level;
import java.util.stream.Stream;
import org.openqa.selenium.By;
import org.openqa.selenium.ElementNotInteractableException;
import org.openqa.selenium.JavascriptException;
import org.openqa.selenium.Keys;
import org.openqa.selenium.NoSuchElementException;
import org.openqa.selenium.OutputType;
import org.openqa.selenium.Rectangle;
import org.openqa.selenium.StaleElementReferenceException;
import org.openqa.selenium.TimeoutException;
import org.openqa.selenium.WebElement;
import org.openqa.selenium.chrome.ChromeDriver;
import org.openqa.selenium.chrome.ChromeDriverService;
import org.openqa.selenium.chrome.ChromeOptions;
import org.openqa.selenium.interactions.Actions;
import org.openqa.selenium.logging.LogType;
import org.openqa.selenium.logging.LoggingPreferences;
import org.openqa.selenium.support.ui.FluentWait;

/** A browser with an empty profile of its own, used by mouse and keyboard; every wait ends as soon as what is awaited is there. */
final class Browser implements AutoCloseable {

    /** Long enough for a busy machine; nothing is told by how long something took. */
    private static final Duration PATIENCE = Duration.ofSeconds(Integer.getInteger("patience", 90));
    private static final Duration POLL = Duration.ofMillis(40);
    /** How long the mouse takes for each of its ways. */
    private static final Duration GLIDE = Duration.ofMillis(60);
    private static final int MOST_TABS = 80;
    private static final Path PICTURES = Path.of("target", "bench-pictures");

    private final ChromeDriver driver;

    /**
     * Opens it.
     *
     * @param downloads folder that takes what is downloaded
     */
    Browser(Path downloads) {
        Chromium chromium = Chromium.find().orElseThrow();
        ChromeOptions options = new ChromeOptions();
        options.setBinary(chromium.browser().toFile());
        options.addArguments("--headless=new", "--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking",
                "--disable-component-update", "--disable-sync", "--disable-default-apps", "--disable-extensions", "--force-color-profile=srgb",
                "--force-prefers-reduced-motion", "--lang=en");
        options.setExperimentalOption("prefs", Map.of("download.default_directory", downloads.toAbsolutePath().toString(),
                "download.prompt_for_download", false));
        LoggingPreferences logs = new LoggingPreferences();
        logs.enable(LogType.PERFORMANCE, Level.ALL);
        logs.enable(LogType.BROWSER, Level.ALL);
        options.setCapability("goog:loggingPrefs", logs);
        ChromeDriverService service = new ChromeDriverService.Builder().usingDriverExecutable(chromium.driver().toFile()).usingAnyFreePort()
                .withSilent(true).build();
        driver = new ChromeDriver(service, options);
        driver.executeCdpCommand("Browser.setDownloadBehavior", Map.of("behavior", "allow", "downloadPath", downloads.toAbsolutePath().toString()));
        size(1280, 800);
    }

    /** Sets the size of the page. */
    void size(int width, int height) {
        size(width, height, 1);
    }

    /** Sets the size of the page in its own pixels, and how many pixels of the screen each of them has. */
    void size(int width, int height, double scale) {
        driver.executeCdpCommand("Emulation.setDeviceMetricsOverride", Map.of("width", width, "height", height, "deviceScaleFactor", scale, "mobile", false));
    }

    /** Makes the system light or dark. */
    void system(String scheme) {
        driver.executeCdpCommand("Emulation.setEmulatedMedia", Map.of("features", List.of(Map.of("name", "prefers-color-scheme", "value", scheme))));
    }

    /** Shows the page as on the screen or as on paper. */
    void medium(String medium) {
        driver.executeCdpCommand("Emulation.setEmulatedMedia", Map.of("media", medium));
    }

    /** Prints the page to paper of a size in inches, with the margins of its style sheet. */
    byte[] pdf(double width, double height) {
        return Base64.getDecoder().decode((String) driver.executeCdpCommand("Page.printToPDF", Map.of("paperWidth", width, "paperHeight", height,
                "printBackground", true)).get("data"));
    }

    void open(String url) {
        driver.get(url);
    }

    String address() {
        return driver.getCurrentUrl();
    }

    /** Waits until something holds; a page that is just being drawn anew is asked again. */
    void await(String what, BooleanSupplier holds) {
        find(what, () -> holds.getAsBoolean() ? Boolean.TRUE : null);
    }

    /** Waits until a value is there. */
    private <T> T find(String what, Supplier<T> value) {
        try {
            return new FluentWait<>(driver).withTimeout(PATIENCE).pollingEvery(POLL).ignoring(NoSuchElementException.class)
                    .ignoring(StaleElementReferenceException.class).ignoring(JavascriptException.class).until(same -> value.get());
        } catch (TimeoutException late) {
            picture("failed");
            throw new AssertionError("never came: " + what + "; the page says: " + said() + "\n" + driver.getCurrentUrl(), late);
        }
    }

    private String said() {
        return String.valueOf(js("return [...document.querySelectorAll('[data-notice] p, [data-said], [data-run], dialog h2')].map(e => e.textContent).join(' | ')"));
    }

    /** Waits until an element is in sight and returns it. */
    WebElement see(String css) {
        return find(css, () -> {
            WebElement found = driver.findElement(By.cssSelector(css));
            return found.isDisplayed() ? found : null;
        });
    }

    /** Returns what is there now. */
    List<WebElement> all(String css) {
        return driver.findElements(By.cssSelector(css));
    }

    boolean has(String css) {
        return !all(css).isEmpty();
    }

    /** Waits until nothing of that kind is there. */
    void gone(String css) {
        await("no " + css, () -> !has(css));
    }

    /** Waits for an element and returns its words. */
    String text(String css) {
        return find("words of " + css, () -> {
            String text = driver.findElement(By.cssSelector(css)).getText();
            return text.isBlank() ? null : text;
        });
    }

    /** Waits until an element holds all these words. */
    void reads(String css, String... words) {
        await(css + " that reads: " + String.join(", ", words), () -> {
            String text = driver.findElement(By.cssSelector(css)).getText();
            return Stream.of(words).allMatch(text::contains);
        });
    }

    /** Presses an element as soon as it can be pressed. */
    void click(String css) {
        find("a press on " + css, () -> {
            try {
                WebElement element = driver.findElement(By.cssSelector(css));
                if (!element.isDisplayed()) {
                    return null;
                }
                reveal(element);
                element.click();
                return Boolean.TRUE;
            } catch (ElementNotInteractableException covered) {
                return null;
            }
        });
    }

    /** Presses an element if it is there now; it may be gone in the same moment, when the page is drawn anew. */
    void pressIfThere(String css) {
        all(css).stream().findFirst().ifPresent(WebElement::click);
    }

    void doubleClick(String css) {
        WebElement element = see(css);
        reveal(element);
        mouse().doubleClick(element).perform();
    }

    /** Sends keys to whatever has the focus. */
    void keys(CharSequence... keys) {
        mouse().sendKeys(keys).perform();
    }

    /** Presses a key while others are held. */
    void chord(CharSequence key, CharSequence... held) {
        Actions actions = mouse();
        List.of(held).forEach(actions::keyDown);
        actions.sendKeys(key);
        List.of(held).forEach(actions::keyUp);
        actions.perform();
    }

    /** Sends text to a field, as a person types it or chooses a file. */
    void type(String css, CharSequence... text) {
        find("a field " + css, () -> driver.findElement(By.cssSelector(css))).sendKeys(text);
    }

    /** Whether what has the focus is of that kind. */
    boolean focused(String css) {
        return Boolean.TRUE.equals(js("return document.activeElement.matches(arguments[0])", css));
    }

    /** Presses the Tab key until the focus is there, as somebody without a mouse does. */
    void tabTo(String css) {
        for (int presses = 0; !focused(css); presses++) {
            if (presses > MOST_TABS) {
                throw new AssertionError("the Tab key does not come to " + css + "; it is at " + js("return document.activeElement.outerHTML.slice(0, 300)"));
            }
            keys(Keys.TAB);
        }
    }

    /** Begins a drag: presses on an element, goes to a place in another one, holds. The place is told from its middle. */
    void hold(String from, String to, int right, int down) {
        WebElement source = see(from);
        js("arguments[0].scrollIntoView({block: 'center', inline: 'nearest'})", see(to));
        reveal(source);
        mouse().moveToElement(source).clickAndHold().moveByOffset(6, 6).moveToElement(see(to), right, down).moveByOffset(1, 1).perform();
    }

    /** Goes on to another element while something is held. */
    void over(String css) {
        mouse().moveToElement(see(css)).moveByOffset(1, 1).perform();
    }

    void drop() {
        mouse().release().perform();
    }

    /** Drags one element onto the middle of another. */
    void drag(String from, String to) {
        hold(from, to, 0, 0);
        drop();
    }

    /** Presses the mouse at a place in an element, told from its upper left corner. */
    void clickAt(String css, long right, long down) {
        WebElement element = see(css);
        reveal(element);
        Rectangle frame = element.getRect();
        mouse().moveToElement(element, Math.toIntExact(right) - frame.getWidth() / 2, Math.toIntExact(down) - frame.getHeight() / 2).click().perform();
    }

    /** Drops a file of the system onto an element, as from a window of the system's own file manager. */
    void dropFile(Path file, String css) {
        Rectangle frame = see(css).getRect();
        for (String event : List.of("dragEnter", "dragOver", "drop")) {
            driver.executeCdpCommand("Input.dispatchDragEvent", Map.of("type", event, "x", frame.getX() + frame.getWidth() / 2, "y", frame.getY() + 40,
                    "data", Map.of("items", List.of(), "files", List.of(file.toAbsolutePath().toString()), "dragOperationsMask", 1)));
        }
    }

    private Actions mouse() {
        return new Actions(driver, GLIDE);
    }

    private void reveal(WebElement element) {
        js("arguments[0].scrollIntoView({block: 'nearest', inline: 'nearest'})", element);
    }

    Object js(String script, Object... arguments) {
        return driver.executeScript(script, arguments);
    }

    /** Runs a script that calls its last argument when it is done. */
    Object later(String script, Object... arguments) {
        driver.manage().timeouts().scriptTimeout(PATIENCE);
        return driver.executeAsyncScript(script, arguments);
    }

    /** Returns when something of the page was first seen, in milliseconds after it was asked for; 0 before. */
    double firstPaint() {
        return ((Number) js("return performance.getEntriesByName('first-contentful-paint')[0]?.startTime ?? 0")).doubleValue();
    }

    /** Returns every address that was asked for since the last time, as the browser itself logs it. */
    List<String> requests() {
        List<String> urls = new ArrayList<>();
        driver.manage().logs().get(LogType.PERFORMANCE).forEach(entry -> {
            String message = entry.getMessage();
            if (message.contains("\"Network.requestWillBeSent\"") || message.contains("\"Network.webSocketCreated\"")) {
                urls.add(message.replaceFirst("(?s).*\"url\":\"([^\"]*)\".*", "$1"));
            }
        });
        return urls;
    }

    /** Returns what the page complained of in the browser's own log. */
    List<String> complaints() {
        return driver.manage().logs().get(LogType.BROWSER).getAll().stream().filter(entry -> entry.getLevel().intValue() >= Level.WARNING.intValue())
                .map(entry -> entry.getMessage()).toList();
    }

    /** Keeps a picture of the page as the output of the test; those of the README are written anew with {@code -Dpictures=write}. */
    void picture(String name) {
        byte[] png = driver.getScreenshotAs(OutputType.BYTES);
        try {
            Files.createDirectories(PICTURES);
            Files.write(PICTURES.resolve(name + ".png"), png);
            if ("write".equals(System.getProperty("pictures")) && KeptPictures.NAMES.contains(name)) {
                Files.createDirectories(KeptPictures.FOLDER);
                Files.write(KeptPictures.FOLDER.resolve(name + ".png"), png);
            }
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        }
    }

    @Override
    public void close() {
        driver.quit();
    }
}
