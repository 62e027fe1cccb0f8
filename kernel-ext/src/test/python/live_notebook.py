"""The notebook in the live classic notebook server, in a real browser. Arguments: the notebook, a folder for screenshots."""
import os
import shutil
import socket
import subprocess
import sys
import tempfile
import time
import unittest
import urllib.request

from selenium import webdriver
from selenium.webdriver.chrome.options import Options
from selenium.webdriver.chrome.service import Service
from selenium.webdriver.common.by import By

NOTEBOOK = sys.argv.pop(1)
SCREENSHOTS = sys.argv.pop(1)
PATIENCE = 180  # seconds; a loaded machine may be slow, no test asks for speed


def until(what, condition):
    end = time.time() + PATIENCE
    while time.time() < end:
        found = condition()
        if found:
            return found
        time.sleep(0.1)
    raise AssertionError("waited in vain for: " + what)


def free_port():
    with socket.socket() as probe:
        probe.bind(("127.0.0.1", 0))
        return probe.getsockname()[1]


class LiveNotebook(unittest.TestCase):
    @classmethod
    def setUpClass(cls):
        cls.folder = tempfile.mkdtemp(prefix="ladderwell-live")
        shutil.copy(NOTEBOOK, os.path.join(cls.folder, "live.ipynb"))
        cls.port = free_port()
        settings = dict(os.environ, JUPYTER_DATA_DIR=os.path.join(cls.folder, "data"),
                        JUPYTER_RUNTIME_DIR=os.path.join(cls.folder, "runtime"),
                        JUPYTER_CONFIG_DIR=os.path.join(cls.folder, "config"))
        cls.log = open(os.path.join(cls.folder, "server.log"), "w")
        cls.server = subprocess.Popen(
            [sys.executable, "-m", "notebook", "--no-browser", "--allow-root", "--ip=127.0.0.1",
             "--port=%d" % cls.port, "--NotebookApp.token=", "--NotebookApp.password="],
            cwd=cls.folder, env=settings, stdout=cls.log, stderr=cls.log)
        options = Options()
        options.binary_location = "/usr/bin/chromium"
        for argument in ["--headless", "--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run",
                         "--disable-background-networking", "--disable-component-update", "--disable-sync",
                         "--window-size=1100,1400", "--user-data-dir=" + os.path.join(cls.folder, "profile")]:
            options.add_argument(argument)
        cls.driver = webdriver.Chrome(service=Service("/usr/bin/chromedriver"), options=options)
        cls.address = "http://127.0.0.1:%d/" % cls.port
        until("the server", cls.answers)

    @classmethod
    def answers(cls):
        try:
            urllib.request.urlopen(cls.address + "api", timeout=5).read()
            return True
        except OSError:
            return False

    @classmethod
    def tearDownClass(cls):
        cls.driver.quit()
        cls.server.terminate()
        cls.server.wait(60)
        cls.log.close()
        shutil.rmtree(cls.folder, ignore_errors=True)

    def script(self, text):
        return self.driver.execute_script(text)

    def open(self):
        self.driver.get(self.address + "notebooks/live.ipynb")
        until("a connected kernel", lambda: self.script(
            "return !!(window.Jupyter && Jupyter.notebook && Jupyter.notebook.kernel"
            " && Jupyter.notebook.kernel.is_connected() && Jupyter.notebook._fully_loaded)"))

    def still(self):
        """Whether every cell has been answered."""
        return self.script("return !Jupyter.notebook.get_cells().some(function (c) {"
                           "return c.cell_type === 'code' && c.element.hasClass('running')})")

    def drawn(self):
        return len(self.driver.find_elements(By.CSS_SELECTOR, ".lw-drawn"))

    def picture(self, name):
        self.driver.save_screenshot(os.path.join(SCREENSHOTS, name))

    def test_run_all_play_reload_and_run_a_later_cell_alone(self):
        self.open()
        self.script("Jupyter.notebook.execute_all_cells()")
        until("the last cell's number", lambda: self.script(
            "var c = Jupyter.notebook.get_cells().filter(function (c) {return c.cell_type === 'code'});"
            "return c.length > 0 && c.every(function (x) {return !!x.input_prompt_number && x.input_prompt_number !== '*'})"))
        self.assertEqual([], self.driver.find_elements(By.CSS_SELECTOR, ".output_error"))
        pictures = len(self.driver.find_elements(By.CSS_SELECTOR, "[data-ladderwell]"))
        self.assertGreaterEqual(pictures, 4)
        until("all pictures drawn", lambda: self.drawn() == pictures)
        self.assertGreater(len(self.driver.find_elements(By.CSS_SELECTOR, ".lw-table")), 2)

        slider = self.driver.find_element(By.CSS_SELECTOR, "[data-ladderwell] input[type=range]")
        self.script("document.querySelector('[data-ladderwell]').scrollIntoView()")
        before = slider.get_attribute("value")
        self.driver.find_element(By.CSS_SELECTOR, "[data-ladderwell] button").click()
        until("the cursor to move", lambda: slider.get_attribute("value") != before)
        self.driver.find_element(By.CSS_SELECTOR, "[data-ladderwell] button").click()
        self.picture("live-notebook.png")

        self.script("Jupyter.notebook.save_checkpoint()")
        until("the notebook saved", lambda: self.script("return !Jupyter.notebook.dirty"))
        self.open()
        until("the pictures of a trusted notebook after a reload", lambda: self.drawn() == pictures)

        # The library goes with the first picture's output; a later cell run alone then asks the kernel for it.
        self.script("Jupyter.notebook.clear_all_output(); Jupyter.notebook.save_checkpoint()")
        until("the notebook saved", lambda: self.script("return !Jupyter.notebook.dirty"))
        self.open()
        self.assertEqual(0, self.drawn())
        self.script(
            "var cells = Jupyter.notebook.get_cells();"
            "for (var i = cells.length - 1; i >= 0; i--)"
            " if (cells[i].get_text().indexOf('animate crossing') >= 0) {cells[i].execute(); break;}")
        until("the picture of a later cell alone", lambda: self.drawn() == 1)
        self.picture("live-later-cell.png")


if __name__ == "__main__":
    unittest.main(verbosity=2)
