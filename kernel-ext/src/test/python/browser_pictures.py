"""Looks at pages of pictures in a real browser. Arguments: the folder with the pages, and a folder for screenshots."""
import json
import os
import shutil
import sys
import tempfile
import time
import unittest

from selenium import webdriver
from selenium.webdriver.chrome.options import Options
from selenium.webdriver.chrome.service import Service
from selenium.webdriver.common.action_chains import ActionChains
from selenium.webdriver.common.by import By
from selenium.webdriver.common.keys import Keys

PAGES = sys.argv.pop(1)
PICTURES = sys.argv.pop(1)
PATIENCE = 30  # seconds; a loaded machine may be slow, no test asks for speed


class Browser:
    def __init__(self, scripts=True, size="860,1000"):
        self.profile = tempfile.mkdtemp(prefix="ladderwell-browser")
        options = Options()
        options.binary_location = "/usr/bin/chromium"
        for argument in ["--headless", "--no-sandbox", "--disable-gpu", "--no-first-run",
                         "--disable-background-networking", "--disable-component-update", "--disable-sync",
                         "--hide-scrollbars", "--window-size=" + size, "--user-data-dir=" + self.profile]:
            options.add_argument(argument)
        if not scripts:
            options.add_experimental_option("prefs", {"profile.managed_default_content_settings.javascript": 2})
        options.set_capability("goog:loggingPrefs", {"browser": "ALL", "performance": "ALL"})
        self.driver = webdriver.Chrome(service=Service("/usr/bin/chromedriver"), options=options)

    def open(self, page):
        self.driver.get("file://" + os.path.join(PAGES, page))
        return self.driver

    def close(self):
        self.driver.quit()
        shutil.rmtree(self.profile, ignore_errors=True)

    def requests(self):
        """Every address that the pages asked for."""
        addresses = []
        for entry in self.driver.get_log("performance"):
            message = json.loads(entry["message"])["message"]
            if message["method"] == "Network.requestWillBeSent":
                addresses.append(message["params"]["request"]["url"])
        return addresses

    def complaints(self):
        return [entry for entry in self.driver.get_log("browser") if entry["level"] in ("SEVERE", "WARNING")]


def until(what, condition):
    end = time.time() + PATIENCE
    while time.time() < end:
        found = condition()
        if found:
            return found
        time.sleep(0.05)
    raise AssertionError("waited in vain for: " + what)


def drawn(driver, count):
    until("%d pictures drawn" % count, lambda: len(driver.find_elements(By.CSS_SELECTOR, ".lw-drawn")) == count)


def curve(driver, root):
    """The path of the density curve, as it stands on the screen."""
    return driver.execute_script(
        "return Array.from(arguments[0].querySelectorAll('.lw-now .xy .scatterlayer path.js-line'))"
        ".map(function(p){return p.getAttribute('d')}).sort(function(a,b){return b.length-a.length})[0]", root)


class ScriptedPage(unittest.TestCase):
    """A page with a module loader in it, as the classic notebook has one, and with two animations and more."""

    @classmethod
    def setUpClass(cls):
        cls.browser = Browser()
        cls.driver = cls.browser.open("light.html")
        drawn(cls.driver, 5)
        cls.motions = [e for e in cls.driver.find_elements(By.CSS_SELECTOR, ".lw")
                       if e.find_elements(By.CSS_SELECTOR, ".lw-controls")]

    @classmethod
    def tearDownClass(cls):
        cls.browser.close()

    def setUp(self):
        for root in self.motions:
            self.driver.execute_script("arguments[0].ladderwell.play(false)", root)

    def cursor(self, root):
        return float(root.find_element(By.CSS_SELECTOR, ".lw-cursor").value_of_css_property("top")[:-2])

    def time_said(self, root):
        return root.find_element(By.CSS_SELECTOR, ".lw-time").text

    def now(self, root):
        return self.driver.execute_script("return arguments[0].ladderwell.now()", root)

    def test_every_picture_has_its_plots_and_no_still(self):
        self.assertEqual(2, len(self.motions))
        for root in self.motions:
            self.assertEqual(2, len(root.find_elements(By.CSS_SELECTOR, ".js-plotly-plot")))
            self.assertTrue(curve(self.driver, root).startswith("M"))
            self.assertEqual(1, len(root.find_elements(By.CSS_SELECTOR, ".lw-strip .heatmaplayer image")))
        self.assertEqual([], self.driver.find_elements(By.CSS_SELECTOR, ".lw-still"))
        self.assertEqual([], [e for e in self.driver.find_elements(By.CSS_SELECTOR, ".lw-hint") if e.is_displayed()])

    def test_pictures_are_told_apart_and_described(self):
        keys = [e.get_attribute("data-ladderwell") for e in self.driver.find_elements(By.CSS_SELECTOR, ".lw")]
        self.assertEqual(len(keys), len(set(keys)))
        for stage in self.driver.find_elements(By.CSS_SELECTOR, ".lw-stage"):
            self.assertEqual("img", stage.get_attribute("role"))
            self.assertGreater(len(stage.get_attribute("aria-label")), 20)

    def test_play_moves_cursor_and_curve_and_pause_stops_them(self):
        root, other = self.motions
        button = root.find_element(By.CSS_SELECTOR, ".lw-play")
        before, line, still = self.cursor(root), curve(self.driver, root), self.now(other)
        self.assertEqual("play", button.get_attribute("aria-label"))
        button.click()
        until("a moving cursor", lambda: self.cursor(root) != before)
        until("a moving curve", lambda: curve(self.driver, root) != line)
        self.assertEqual("pause", button.get_attribute("aria-label"))
        button.click()
        self.assertEqual("play", button.get_attribute("aria-label"))
        at = self.now(root)
        time.sleep(0.4)
        self.assertEqual(at, self.now(root))
        self.assertEqual(still, self.now(other), "the other animation stood still")

    def test_slider_scrubs(self):
        root = self.motions[0]
        slider = root.find_element(By.CSS_SELECTOR, ".lw-slider")
        last = int(slider.get_attribute("max"))
        self.driver.execute_script(
            "arguments[0].value=%d;arguments[0].dispatchEvent(new Event('input',{bubbles:true}))" % last, slider)
        self.assertEqual(last, self.now(root))
        self.assertEqual("3.00 periods = 2.50 µs", self.time_said(root))
        self.assertEqual(self.time_said(root), slider.get_attribute("aria-valuetext"))

    def test_keys_step_and_play(self):
        root = self.motions[0]
        slider = root.find_element(By.CSS_SELECTOR, ".lw-slider")
        self.driver.execute_script("arguments[0].ladderwell.show(10);arguments[1].focus()", root, slider)
        slider.send_keys(Keys.ARROW_RIGHT)
        self.assertEqual(11, self.now(root))
        slider.send_keys(Keys.ARROW_LEFT, Keys.ARROW_LEFT)
        self.assertEqual(9, self.now(root))
        slider.send_keys(Keys.END)
        self.assertEqual(int(slider.get_attribute("max")), self.now(root))
        slider.send_keys(Keys.HOME)
        self.assertEqual(0, self.now(root))
        slider.send_keys(Keys.SPACE)
        until("playing", lambda: self.now(root) > 0)
        slider.send_keys(Keys.SPACE)
        at = self.now(root)
        time.sleep(0.3)
        self.assertEqual(at, self.now(root))

    def test_space_on_the_button_plays_once(self):
        root = self.motions[1]
        button = root.find_element(By.CSS_SELECTOR, ".lw-play")
        self.driver.execute_script("arguments[0].focus()", button)
        button.send_keys(Keys.SPACE)
        self.assertEqual("pause", button.get_attribute("aria-label"))

    def test_click_and_drag_on_the_strip_set_the_time(self):
        root = self.motions[0]
        self.driver.execute_script("arguments[0].scrollIntoView();arguments[0].ladderwell.show(0)", root)
        strip = root.find_element(By.CSS_SELECTOR, ".lw-strip .nsewdrag")
        last = int(root.find_element(By.CSS_SELECTOR, ".lw-slider").get_attribute("max"))
        ActionChains(self.driver).move_to_element(strip).click().perform()
        self.assertAlmostEqual(last / 2, self.now(root), delta=last / 40)
        # a click lands on a pixel, a pixel on the nearest frame
        self.assertAlmostEqual(1.5, float(self.time_said(root).split()[0]), delta=0.05)
        ActionChains(self.driver).move_to_element(strip).click_and_hold().move_by_offset(20, 40).release().perform()
        self.assertGreater(self.now(root), last * 0.6)
        at = self.now(root)
        ActionChains(self.driver).move_to_element(strip).perform()
        self.assertEqual(at, self.now(root), "a released drag is over")

    def test_keys_do_not_reach_the_page(self):
        root = self.motions[0]
        self.driver.execute_script(
            "window.heard=0;document.addEventListener('keydown',function(){window.heard++});arguments[0].focus()",
            root.find_element(By.CSS_SELECTOR, ".lw-slider"))
        root.find_element(By.CSS_SELECTOR, ".lw-slider").send_keys(Keys.ARROW_RIGHT)
        self.assertEqual(0, self.driver.execute_script("return window.heard"))

    def test_a_page_that_turns_dark_gets_light_ink(self):
        root = self.motions[0]
        self.driver.execute_script("document.body.style.background='#15171B';document.body.style.color='#eee'")
        try:
            until("light ink", lambda: "lw-dark" in root.get_attribute("class"))
        finally:
            self.driver.execute_script("document.body.style.background='#fff';document.body.style.color='#1E2430'")
            until("dark ink", lambda: "lw-dark" not in root.get_attribute("class"))

    def test_a_narrow_page_gets_a_narrow_picture(self):
        root = self.motions[0]
        plot = root.find_element(By.CSS_SELECTOR, ".lw-now .main-svg")
        wide = plot.size["width"]
        self.driver.execute_script("document.body.style.width='420px'")
        try:
            until("a narrow plot", lambda: plot.size["width"] < wide - 200)
        finally:
            self.driver.execute_script("document.body.style.width=''")
            until("a wide plot", lambda: plot.size["width"] == wide)

    def test_hostile_names_stay_text(self):
        self.assertIsNone(self.driver.execute_script("return window.hacked || null"))
        self.assertIn("<img src=x onerror", self.driver.find_element(By.TAG_NAME, "body").text)

    def test_globals_of_the_page_are_left_alone(self):
        self.assertFalse(self.driver.execute_script("return 'Plotly' in window"))
        self.assertEqual(0, self.driver.execute_script("return window.modulesAsked"))

    def test_z_no_request_and_no_complaint(self):
        addresses = [a for a in self.browser.requests() if not a.startswith(("file:", "data:", "blob:", "chrome:"))]
        self.assertEqual([], addresses)
        self.assertEqual([], self.driver.execute_script(
            "return performance.getEntriesByType('resource').map(e=>e.name).filter(n=>!/^(data|blob):/.test(n))"))
        self.assertEqual([], self.browser.complaints())


class DarkPage(unittest.TestCase):
    def test_dark_pages_have_light_ink_and_a_map_that_rises_from_the_paper(self):
        browser = Browser()
        try:
            driver = browser.open("dark.html")
            drawn(driver, 5)
            root = driver.find_elements(By.CSS_SELECTOR, ".lw")[0]
            self.assertIn("lw-dark", root.get_attribute("class"))
            scale = driver.execute_script(
                "return arguments[0].querySelector('.lw-strip').data[0].colorscale.map(function(s){"
                "var e=document.createElement('i');e.style.color=s[1];document.body.appendChild(e);"
                "var c=getComputedStyle(e).color.match(/[\\d.]+/g).map(Number);e.remove();"
                "return .2126*c[0]+.7152*c[1]+.0722*c[2]})", root)
            self.assertEqual(sorted(scale), scale)
            self.assertEqual([], browser.complaints())
        finally:
            browser.close()

    def test_light_maps_fall_from_the_paper(self):
        browser = Browser()
        try:
            driver = browser.open("light.html")
            drawn(driver, 5)
            scale = driver.execute_script(
                "return document.querySelector('.lw-strip').data[0].colorscale.map(function(s){"
                "var e=document.createElement('i');e.style.color=s[1];document.body.appendChild(e);"
                "var c=getComputedStyle(e).color.match(/[\\d.]+/g).map(Number);e.remove();"
                "return .2126*c[0]+.7152*c[1]+.0722*c[2]})")
            self.assertEqual(sorted(scale, reverse=True), scale)
        finally:
            browser.close()


class PhasePage(unittest.TestCase):
    """A Wigner function at an instant, and one that moves below its density."""

    def test_fields_are_drawn_with_orbit_and_dashed_negative_parts_and_move(self):
        browser = Browser()
        try:
            driver = browser.open("phase.html")
            drawn(driver, 2)
            still, film = driver.find_elements(By.CSS_SELECTOR, ".lw")
            self.assertEqual(1, len(still.find_elements(By.CSS_SELECTOR, ".heatmaplayer image")))
            self.assertGreater(len(still.find_elements(By.CSS_SELECTOR, ".contour path")), 2)
            self.assertIn("negativity", still.find_element(By.CSS_SELECTOR, ".lw-verdict").text)
            self.assertIsNone(driver.execute_script("return window.hacked || null"))
            image = "return arguments[0].querySelector('.heatmaplayer image').href.baseVal"
            ring = ("return Array.from(arguments[0].querySelectorAll('.scatterlayer .points path'))"
                    ".map(function(p){return p.getAttribute('transform')}).join()")
            driver.execute_script("arguments[0].ladderwell.show(3)", film)
            time.sleep(0.5)
            before, there, line = driver.execute_script(image, film), driver.execute_script(ring, film), curve(driver, film)
            driver.execute_script("arguments[0].ladderwell.show(20)", film)
            until("another field", lambda: driver.execute_script(image, film) != before)
            until("a ring elsewhere", lambda: driver.execute_script(ring, film) != there)
            until("another density", lambda: curve(driver, film) != line)
            # the same positions stand below one another: both drawings share their scale
            ranges = driver.execute_script(
                "return Array.from(arguments[0].querySelectorAll('.js-plotly-plot')).map(function(e){"
                "return e.layout.xaxis.range.join()})", film)
            self.assertEqual(2, len(ranges))
            self.assertEqual(ranges[0], ranges[1])
            self.assertEqual([], browser.complaints())
        finally:
            browser.close()


class PageWithoutScripts(unittest.TestCase):
    def test_stills_stand_in(self):
        browser = Browser(scripts=False)
        try:
            driver = browser.open("light.html")
            stills = driver.find_elements(By.CSS_SELECTOR, "img.lw-still")
            self.assertEqual(4, len(stills))
            for still in stills:
                self.assertTrue(still.is_displayed())
                self.assertGreater(still.size["height"], 80)
                self.assertGreater(int(still.get_property("naturalWidth")), 700)
            self.assertEqual([], driver.find_elements(By.CSS_SELECTOR, ".lw-controls"))
            self.assertEqual([], [e for e in driver.find_elements(By.CSS_SELECTOR, ".lw-hint") if e.is_displayed()])
        finally:
            browser.close()


class PageWithoutTheLibrary(unittest.TestCase):
    def test_the_still_stays_and_a_line_says_what_to_do(self):
        browser = Browser()
        try:
            driver = browser.open("missing.html")
            hint = driver.find_element(By.CSS_SELECTOR, ".lw-hint")
            until("the line", hint.is_displayed)
            self.assertIn("run that cell again", hint.text)
            self.assertTrue(driver.find_element(By.CSS_SELECTOR, "img.lw-still").is_displayed())
            # The library comes late, as when the first picture's cell is run again.
            driver.execute_script("var s=document.createElement('script');s.textContent=document.getElementById("
                                  "'library').textContent;document.head.appendChild(s)")
            drawn(driver, 1)
            self.assertFalse(hint.is_displayed())
        finally:
            browser.close()

    def test_a_live_notebook_is_asked_for_it(self):
        browser = Browser()
        try:
            driver = browser.open("live.html")
            drawn(driver, 2)
            self.assertEqual(["ladderwell.library"], driver.execute_script("return window.comms"))
        finally:
            browser.close()


class Screenshots(unittest.TestCase):
    """Kept for people to look at."""

    def test_light_and_dark(self):
        browser = Browser(size="830,1400")
        try:
            for page in ("light", "dark"):
                driver = browser.open(page + ".html")
                drawn(driver, 5)
                root = driver.find_elements(By.CSS_SELECTOR, ".lw")[0]
                driver.execute_script("arguments[0].ladderwell.show(52);window.scrollTo(0,0);"
                                      "window.scrollTo(0,arguments[0].getBoundingClientRect().top-20)", root)
                time.sleep(0.3)
                path = os.path.join(PICTURES, "animation-" + page + ".png")
                self.assertTrue(root.screenshot(path))
                self.assertLess(os.path.getsize(path), 150000)
        finally:
            browser.close()


if __name__ == "__main__":
    unittest.main(verbosity=2)
