"""Declare, evolve, table and picture in the real kernel. Lines that start with "measured:" are for reading."""
import time
import unittest

from jupyter_client.manager import start_new_kernel

PATIENCE = 120


class MainJobTests(unittest.TestCase):
    @classmethod
    def setUpClass(cls):
        cls.km, cls.kc = start_new_kernel(kernel_name="ladderwell-test", startup_timeout=PATIENCE)

    @classmethod
    def tearDownClass(cls):
        cls.kc.stop_channels()
        cls.km.shutdown_kernel()

    def run_cell(self, code):
        """The reply's content and the displayed and resulting bundles, in order."""
        shown = []
        begin = time.time()
        reply = self.kc.execute_interactive(code, timeout=PATIENCE, output_hook=shown.append)["content"]
        print("measured: %.3f s for %r" % (time.time() - begin, code[:60]))
        return reply, [m["content"]["data"] for m in shown if "data" in m["content"]]

    def test_the_main_job(self):
        reply, shown = self.run_cell("%oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz")
        self.assertEqual(reply["status"], "ok", reply)
        self.assertIn("text/html", shown[0])
        self.assertIn("trap", shown[0]["text/plain"])
        reply, shown = self.run_cell(
            "%%declare\n# one mode\nstate psi: coherent in trap, mean 9.5, phase 30 deg\n"
            "evolve run: psi for 3 periods, frames 60\ntable run: position, spread of position, energy"
        )
        self.assertEqual(reply["status"], "ok", reply)
        self.assertEqual(len(shown), 3)
        self.assertIn("position", shown[-1]["text/plain"])
        reply, shown = self.run_cell("%animate run")
        self.assertEqual(reply["status"], "ok", reply)
        self.assertIn("text/plain", shown[0])
        self.assertIn("text/html", shown[0])
        reply, shown = self.run_cell("double nbar = 4.5;\nRun mine = run;\ntrap")
        self.assertEqual(reply["status"], "ok", reply)
        self.assertIn("text/html", shown[0])
        reply, shown = self.run_cell("%state phi: coherent in trap, mean {nbar}")
        self.assertEqual(reply["status"], "ok", reply)
        self.assertIn("4.5", shown[0]["text/plain"])

    def test_a_table_of_a_java_cell_is_shown(self):
        reply, shown = self.run_cell('Table.create("t").addColumns(DoubleColumn.create("x", 1.5, 2.5))')
        self.assertEqual(reply["status"], "ok", reply)
        self.assertIn("<table", shown[0]["text/html"])

    def test_a_mistake_loses_no_name(self):
        self.run_cell("%oscillator kept: harmonic, mass 1 u, frequency 1 MHz")
        reply, _ = self.run_cell("%oscillator kept: harmonic, mass -1 u, frequency 1 MHz")
        self.assertEqual(reply["status"], "error")
        self.assertIn("^", "\n".join(reply["traceback"]))
        reply, _ = self.run_cell("%state s: coherent in kept, mean 2")
        self.assertEqual(reply["status"], "ok", reply)

    def test_completion_and_help(self):
        msg_id = self.kc.complete("%osc", 4)
        self.assertIn("oscillator", [m.strip() for m in self.answer(msg_id)["matches"]])
        msg_id = self.kc.inspect("%state q: coherent in trap, mean 3", 30)
        self.assertTrue(self.answer(msg_id)["found"])

    def answer(self, msg_id):
        while True:
            reply = self.kc.get_shell_msg(timeout=PATIENCE)
            if reply["parent_header"].get("msg_id") == msg_id:
                return reply["content"]


if __name__ == "__main__":
    unittest.main()
