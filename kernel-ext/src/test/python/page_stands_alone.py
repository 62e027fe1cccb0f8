"""Opens the page of a run in headless Chromium: its title and the plots it must at least draw
are given; it must fetch nothing and complain of nothing."""
import pathlib
import sys
import time

from selenium import webdriver
from selenium.webdriver.chrome.options import Options
from selenium.webdriver.chrome.service import Service
from selenium.webdriver.common.by import By

options = Options()
for argument in ("--headless=new", "--no-sandbox", "--disable-gpu", "--disable-dev-shm-usage", "--window-size=1100,1400"):
    options.add_argument(argument)
options.set_capability("goog:loggingPrefs", {"browser": "ALL"})
browser = webdriver.Chrome(service=Service("/usr/bin/chromedriver"), options=options)
try:
    browser.get(pathlib.Path(sys.argv[1]).resolve().as_uri())
    end = time.monotonic() + 60
    title, least, plots = sys.argv[2], int(sys.argv[3]), []
    while len(plots) < least and time.monotonic() < end:
        time.sleep(0.5)
        plots = browser.find_elements(By.CSS_SELECTOR, ".js-plotly-plot")
    assert len(plots) >= least, "only %d plots were drawn" % len(plots)
    assert browser.title == title, browser.title
    fetched = browser.execute_script("return performance.getEntriesByType('resource').map(e => e.name)")
    assert not [name for name in fetched if not name.startswith("data:")], fetched
    log = browser.get_log("browser")
    assert not log, log
    wide = browser.execute_script(
        "return [document.documentElement.scrollWidth, document.documentElement.clientWidth]")
    assert wide[0] <= wide[1], "the page is wider than the window: %s" % wide
finally:
    browser.quit()
