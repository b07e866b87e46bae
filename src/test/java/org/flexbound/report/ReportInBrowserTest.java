package org.flexbound.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.logging.Level;
import java.util.logging.Logger;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.flexbound.report.page.ReportMaker;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.By;
import org.openqa.selenium.Keys;
import org.openqa.selenium.WebElement;
import org.openqa.selenium.chrome.ChromeDriver;
import org.openqa.selenium.chrome.ChromeDriverService;
import org.openqa.selenium.chrome.ChromeOptions;
import org.openqa.selenium.interactions.Actions;
import org.openqa.selenium.logging.LogType;
import org.openqa.selenium.logging.LoggingPreferences;

/**
 * The report opened from disk in headless Chromium with the network off. Skipped with a message where Chromium and its driver (Debian:
 * {@code chromium}, {@code chromium-driver}) are not installed.
 */
class ReportInBrowserTest {
  /** Held, so that its level stays: the driver otherwise warns of a protocol newer than its library. */
  private static final Logger DRIVER_LOG = Logger.getLogger("org.openqa.selenium");

  @TempDir private static Path folder;

  private static Optional<ChromeDriver> browser = Optional.empty();

  private static Optional<Path> program(String... names) {
    String path = System.getenv().getOrDefault("PATH", "");
    return Stream.of(path.split(File.pathSeparator, -1))
        .filter(part -> !part.isEmpty())
        .flatMap(part -> Stream.of(names).map(name -> Path.of(part, name)))
        .filter(Files::isExecutable)
        .findFirst();
  }

  @BeforeAll
  static void open() throws IOException {
    DRIVER_LOG.setLevel(Level.SEVERE);
    Optional<Path> chromium = program("chromium", "chromium-browser", "google-chrome");
    Optional<Path> driver = program("chromedriver");
    assumeTrue(chromium.isPresent() && driver.isPresent(),
        "Chromium or its driver is not installed: the report was not tried in a browser");
    Files.writeString(folder.resolve("report.html"), ReportHtml.page(ReportMaker.make(InventedResults.small(), UnitSystem.MM_KN)));
    ChromeOptions options = new ChromeOptions();
    options.setBinary(chromium.get().toFile());
    options.addArguments("--headless=new", "--no-sandbox", "--disable-gpu", "--disable-dev-shm-usage", "--force-prefers-reduced-motion",
        "--host-resolver-rules=MAP * ~NOTFOUND", "--proxy-server=127.0.0.1:9", "--disable-background-networking");
    LoggingPreferences logs = new LoggingPreferences();
    logs.enable(LogType.PERFORMANCE, Level.ALL);
    logs.enable(LogType.BROWSER, Level.ALL);
    options.setCapability("goog:loggingPrefs", logs);
    ChromeDriverService service = new ChromeDriverService.Builder().usingDriverExecutable(driver.get().toFile()).withSilent(true).build();
    browser = Optional.of(new ChromeDriver(service, options));
  }

  @AfterAll
  static void close() {
    browser.ifPresent(ChromeDriver::quit);
  }

  @BeforeEach
  void load() {
    width(1280, false);
    chrome().get(folder.resolve("report.html").toUri().toString());
  }

  /** Whatever a test did, the page asked for nothing but itself and reported no error. */
  @AfterEach
  void nothingLeftThePage() {
    List<String> requests = new ArrayList<>();
    chrome().manage().logs().get(LogType.PERFORMANCE).forEach(entry -> {
      String message = entry.getMessage();
      if (message.contains("\"Network.requestWillBeSent\"")) {
        Matcher url = Pattern.compile("\"url\":\"([^\"]+)\"").matcher(message);
        if (url.find()) {
          requests.add(url.group(1));
        }
      }
    });
    assertThat(requests).isNotEmpty().allMatch(url -> url.startsWith("file:") && url.endsWith("/report.html"));
    assertThat(chrome().manage().logs().get(LogType.BROWSER).getAll()).isEmpty();
  }

  private static ChromeDriver chrome() {
    return browser.orElseThrow();
  }

  private static void width(int pixels, boolean phone) {
    chrome().executeCdpCommand("Emulation.setDeviceMetricsOverride",
        Map.of("width", pixels, "height", 800, "deviceScaleFactor", 1, "mobile", phone));
  }

  private static Object ask(String script, Object... arguments) {
    Object answer = chrome().executeScript(script, arguments);
    assertThat(answer).as("answer to: %s", script).isNotNull();
    return answer;
  }

  private static void scrollTo(WebElement element) {
    chrome().executeScript("arguments[0].scrollIntoView({block: 'center', behavior: 'instant'})", element);
  }

  @Test
  void aPointUnderThePointerTellsItsReading() {
    WebElement point = chrome().findElement(By.cssSelector("svg.figure .spots circle"));
    scrollTo(point);
    String title = String.valueOf(ask("return arguments[0].querySelector('title').textContent", point));
    WebElement tip = chrome().findElement(By.id("tip"));
    assertThat(tip.isDisplayed()).isFalse();
    new Actions(chrome()).moveToElement(point).perform();
    assertThat(tip.isDisplayed()).isTrue();
    assertThat(tip.getText().replaceAll("\\s+", " ")).isEqualTo(title.strip().replaceAll("\\s+", " "));
    new Actions(chrome()).moveToLocation(2, 2).perform();
    assertThat(tip.isDisplayed()).isFalse();
  }

  @Test
  void theStructureTurnsWithTheMouseAndWithTheArrowKeys() {
    WebElement structure = chrome().findElement(By.cssSelector("svg.space"));
    scrollTo(structure);
    String line = "return arguments[0].querySelector('[data-p][points]').getAttribute('points')";
    Object before = ask(line, structure);
    new Actions(chrome()).moveToElement(structure).clickAndHold().moveByOffset(60, 20).release().perform();
    Object dragged = ask(line, structure);
    assertThat(dragged).isNotEqualTo(before);
    new Actions(chrome()).moveToElement(structure, 30, 10).perform();
    assertThat(ask(line, structure)).as("the button is up: moving turns nothing").isEqualTo(dragged);
    chrome().executeScript("arguments[0].focus()", structure);
    new Actions(chrome()).sendKeys(Keys.ARROW_LEFT).perform();
    assertThat(ask(line, structure)).isNotEqualTo(dragged);
  }

  @Test
  void onATelephoneOnlyTablesScrollSideways() {
    width(390, true);
    chrome().navigate().refresh();
    assertThat(ask("return document.documentElement.scrollWidth")).isEqualTo(390L);
    Object wide = ask("return Array.from(document.querySelectorAll('main *, header *, footer *')).filter(function (e) {"
        + " return !e.closest('.table') && !e.closest('svg') && e.getBoundingClientRect().right > 391; }).map(function (e) {"
        + " return e.tagName + '.' + e.className; })");
    assertThat((List<?>) wide).as("elements that stick out of the page").isEmpty();
  }

  @Test
  void theFiguresStandWithoutScripts() {
    chrome().executeCdpCommand("Emulation.setScriptExecutionDisabled", Map.of("value", true));
    chrome().navigate().refresh();
    List<WebElement> figures = chrome().findElements(By.cssSelector("svg.figure"));
    assertThat(figures).hasSizeGreaterThan(10).allMatch(WebElement::isDisplayed);
    assertThat(chrome().findElement(By.id("tip")).isDisplayed()).isFalse();
    chrome().executeCdpCommand("Emulation.setScriptExecutionDisabled", Map.of("value", false));
  }

  /** WCAG 2.1, success criterion 1.4.3: 4.5 to 1, or 3 to 1 for large text; luminance as defined there. */
  @Test
  void textStandsOutFromItsGround() {
    Object weak = ask("function rgb(s) { var m = s.match(/[\\d.]+/g).map(Number); return m.length > 3 && m[3] === 0 ? null : m; }"
        + "function ground(e) { while (e) { var c = rgb(getComputedStyle(e).backgroundColor); if (c) { return c; } e = e.parentElement; }"
        + " return [255, 255, 255]; }"
        + "function light(c) { var v = c.slice(0, 3).map(function (x) { x /= 255; return x <= 0.03928 ? x / 12.92 :"
        + " Math.pow((x + 0.055) / 1.055, 2.4); }); return 0.2126 * v[0] + 0.7152 * v[1] + 0.0722 * v[2]; }"
        + "return Array.from(document.querySelectorAll('body *')).filter(function (e) {"
        + " if (e.closest('svg') && e.tagName !== 'text') { return false; }"
        + " return Array.from(e.childNodes).some(function (n) { return n.nodeType === 3 && n.textContent.trim(); }); }).filter(function (e) {"
        + " var style = getComputedStyle(e); var ink = rgb(e.tagName === 'text' ? style.fill : style.color);"
        + " var a = light(ink || [0, 0, 0]), b = light(ground(e.closest('svg') ? e.closest('figure') || e : e));"
        + " var ratio = (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);"
        + " var size = parseFloat(style.fontSize), large = size >= 24 || (size >= 18.7 && Number(style.fontWeight) >= 700);"
        + " return ratio < (large ? 3 : 4.5); }).map(function (e) { return e.tagName + ' ' + e.textContent.trim().slice(0, 40); })");
    assertThat((List<?>) weak).isEmpty();
  }
}
