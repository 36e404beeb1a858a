package emberline.cli;

import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.Closeable;
import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import java.util.logging.Level;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.openqa.selenium.By;
import org.openqa.selenium.JavascriptExecutor;
import org.openqa.selenium.WebElement;
import org.openqa.selenium.chrome.ChromeDriver;
import org.openqa.selenium.chrome.ChromeDriverService;
import org.openqa.selenium.chrome.ChromeOptions;
import org.openqa.selenium.logging.LogEntry;
import org.openqa.selenium.logging.LogType;
import org.openqa.selenium.logging.LoggingPreferences;

/**
 * A headless Chromium that looks at pages from disk and tells what it complained of and asked for.
 */
final class Browser implements Closeable {

    private static final Pattern ADDRESS = Pattern.compile("\"url\":\"([^\"]*)\"");
    private static final Duration PATIENCE = Duration.ofSeconds(60);

    private final ChromeDriver driver;

    private Browser(ChromeDriver driver) {
        this.driver = driver;
    }

    /** Starts one; skips the test, with a message, where none is installed. */
    static Browser start(Path downloads) {
        Optional<Path> browser = installed("chromium", "chromium-browser", "google-chrome");
        Optional<Path> helper = installed("chromedriver");
        assumeTrue(
                browser.isPresent() && helper.isPresent(),
                "the survey page is NOT tested: no chromium with chromedriver on the path; install"
                        + " chromium and chromium-driver");
        ChromeOptions options = new ChromeOptions();
        options.setBinary(browser.get().toFile());
        options.addArguments(
                "--headless=new",
                "--no-sandbox",
                "--disable-gpu",
                "--disable-dev-shm-usage",
                "--disable-background-networking",
                "--disable-component-update",
                "--disable-sync",
                "--disable-quic",
                "--no-first-run",
                "--window-size=1400,900");
        options.setExperimentalOption(
                "prefs",
                Map.of(
                        "download.default_directory",
                        downloads.toAbsolutePath().toString(),
                        "download.prompt_for_download",
                        false));
        LoggingPreferences logs = new LoggingPreferences();
        logs.enable(LogType.BROWSER, Level.ALL);
        logs.enable(LogType.PERFORMANCE, Level.ALL);
        options.setCapability("goog:loggingPrefs", logs);
        ChromeDriverService service =
                new ChromeDriverService.Builder()
                        .usingDriverExecutable(helper.get().toFile())
                        .build();
        return new Browser(new ChromeDriver(service, options));
    }

    private static Optional<Path> installed(String... names) {
        return Stream.of(names)
                .flatMap(
                        name ->
                                Stream.of(System.getenv("PATH").split(File.pathSeparator, -1))
                                        .map(folder -> Path.of(folder, name)))
                .filter(Files::isExecutable)
                .findFirst();
    }

    /** Opens a page and waits until its script has run. */
    void open(Path page, String fragment) {
        driver.get("about:blank");
        driver.get(page.toUri() + fragment);
        await(
                () ->
                        Boolean.TRUE.equals(
                                run("return document.documentElement.dataset.ready == 'yes'")),
                "the script of the page did not come to its end: " + complaints());
    }

    Object run(String script, Object... arguments) {
        return ((JavascriptExecutor) driver).executeScript(script, arguments);
    }

    ChromeDriver driver() {
        return driver;
    }

    WebElement find(String selector) {
        return driver.findElement(By.cssSelector(selector));
    }

    /** Chooses an option of a list by its value or its text. */
    void choose(String list, String option) {
        find(list).findElements(By.tagName("option")).stream()
                .filter(
                        o ->
                                option.equals(o.getDomProperty("value"))
                                        || option.equals(o.getDomProperty("text")))
                .findFirst()
                .orElseThrow()
                .click();
    }

    /** The texts of all elements of a selector. */
    List<String> texts(String selector) {
        return driver.findElements(By.cssSelector(selector)).stream()
                .map(WebElement::getText)
                .toList();
    }

    /** Waits until something holds. */
    static void await(BooleanSupplier holds, String complaint) {
        long end = System.nanoTime() + PATIENCE.toNanos();
        while (!holds.getAsBoolean()) {
            if (System.nanoTime() > end) {
                throw new AssertionError(complaint);
            }
            try {
                Thread.sleep(30);
            } catch (InterruptedException e) {
                Thread.currentThread().interrupt();
                throw new AssertionError("interrupted", e);
            }
        }
    }

    /** Warnings and errors of the console since the last call. */
    List<String> complaints() {
        return driver.manage().logs().get(LogType.BROWSER).getAll().stream()
                .filter(entry -> entry.getLevel().intValue() >= Level.WARNING.intValue())
                .map(LogEntry::getMessage)
                .toList();
    }

    /** Addresses that the page asked for since the last call. */
    List<String> requests() {
        List<String> addresses = new ArrayList<>();
        for (LogEntry entry : driver.manage().logs().get(LogType.PERFORMANCE)) {
            if (entry.getMessage().contains("Network.requestWillBeSent\"")) {
                Matcher matcher = ADDRESS.matcher(entry.getMessage());
                while (matcher.find()) {
                    addresses.add(matcher.group(1));
                }
            }
        }
        return addresses;
    }

    @Override
    public void close() throws IOException {
        driver.quit();
    }
}
