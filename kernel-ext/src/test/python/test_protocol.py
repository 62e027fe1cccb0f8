"""What jupyter_kernel_test does not ask, with a raw client. Lines that start with "measured:" are for reading."""
import json
import os
import time
import unittest
import uuid
from queue import Empty

from jupyter_client.manager import start_new_kernel

PATIENCE = 60


class ProtocolTests(unittest.TestCase):
    @classmethod
    def setUpClass(cls):
        cls.km, cls.kc = start_new_kernel(kernel_name="ladderwell-test")

    @classmethod
    def tearDownClass(cls):
        cls.kc.stop_channels()
        begin = time.time()
        cls.km.shutdown_kernel()
        print("measured: shut down in %.2f s" % (time.time() - begin))

    def reply_to(self, msg_id, channel="shell"):
        get = self.kc.get_shell_msg if channel == "shell" else self.kc.get_control_msg
        while True:
            reply = get(timeout=PATIENCE)
            if reply["parent_header"].get("msg_id") == msg_id:
                return reply

    def outputs_of(self, msg_id):
        """Everything published for a request between busy and idle."""
        found = []
        while True:
            msg = self.kc.get_iopub_msg(timeout=PATIENCE)
            if msg["parent_header"].get("msg_id") != msg_id:
                continue
            if msg["msg_type"] == "status":
                if msg["content"]["execution_state"] == "idle":
                    return found
                continue
            found.append(msg)

    def run_cell(self, code, **kwargs):
        msg_id = self.kc.execute(code, **kwargs)
        return self.reply_to(msg_id)["content"], self.outputs_of(msg_id)

    def texts(self, outputs, name="stdout"):
        return "".join(
            m["content"]["text"] for m in outputs if m["msg_type"] == "stream" and m["content"]["name"] == name
        )

    def test_silent_says_nothing_and_does_not_count(self):
        before, _ = self.run_cell("1+1")
        reply, outputs = self.run_cell("int silently = 4; System.out.println(3); display(1); 5", silent=True)
        self.assertEqual(reply["status"], "ok")
        self.assertEqual(outputs, [])
        after, _ = self.run_cell("silently")
        self.assertEqual(after["execution_count"], before["execution_count"] + 1)

    def test_unstored_cells_stay_out_of_history(self):
        before, _ = self.run_cell("1+2")
        _, outputs = self.run_cell("987654", store_history=False)
        self.assertTrue(any(m["msg_type"] == "execute_result" for m in outputs))
        after, _ = self.run_cell("1+3")
        self.assertEqual(after["execution_count"], before["execution_count"] + 1)
        msg_id = self.kc.history(hist_access_type="tail", n=2, output=False, raw=True)
        lines = [entry[2] for entry in self.reply_to(msg_id)["content"]["history"]]
        self.assertEqual(lines, ["1+2", "1+3"])

    def test_user_expressions(self):
        reply, outputs = self.run_cell(
            "int ue = 20;", user_expressions={"good": "ue + 1", "bad": "ue / 0", "worse": "no such thing"}
        )
        values = reply["user_expressions"]
        self.assertEqual(values["good"]["status"], "ok")
        self.assertEqual(values["good"]["data"]["text/plain"], "21")
        self.assertEqual(values["bad"]["status"], "error")
        self.assertEqual(values["bad"]["ename"], "java.lang.ArithmeticException")
        self.assertEqual(values["worse"]["status"], "error")
        self.assertEqual([m["msg_type"] for m in outputs], ["execute_input"])

    def test_cells_after_an_error_are_aborted(self):
        ids = [self.kc.execute(code) for code in ("Thread.sleep(300); int z = 1/0;", "int never = 1;", "%count nor: 2")]
        statuses = [self.reply_to(i)["content"]["status"] for i in ids]
        self.assertEqual(statuses, ["error", "aborted", "aborted"])
        self.outputs_of(ids[-1])
        reply, _ = self.run_cell("never")
        self.assertEqual(reply["status"], "error")
        ids = [self.kc.execute("int z = 1/0;", stop_on_error=False), self.kc.execute("2+2")]
        self.assertEqual([self.reply_to(i)["content"]["status"] for i in ids], ["error", "ok"])
        self.outputs_of(ids[-1])

    def test_queued_cells_run_in_order(self):
        ids = [self.kc.execute("Thread.sleep(200); System.out.println(%d);" % i) for i in range(3)]
        self.assertEqual([self.texts(self.outputs_of(i)) for i in ids], ["0\n", "1\n", "2\n"])
        counts = [self.reply_to(i)["content"]["execution_count"] for i in ids]
        self.assertEqual(counts, list(range(counts[0], counts[0] + 3)))

    def interrupt(self, code, ready):
        msg_id = self.kc.execute(code)
        while True:
            msg = self.kc.get_iopub_msg(timeout=PATIENCE)
            if msg["parent_header"].get("msg_id") == msg_id and msg["msg_type"] == ready:
                break
        time.sleep(0.3)
        begin = time.time()
        self.km.interrupt_kernel()
        content = self.reply_to(msg_id)["content"]
        print("measured: interrupted %r after %.3f s" % (code[:50], time.time() - begin))
        self.assertEqual((content["status"], content["ename"]), ("error", "Interrupted"))
        self.assertEqual(self.outputs_of(msg_id)[-1]["msg_type"], "error")
        reply, outputs = self.run_cell("40+2")
        self.assertEqual(outputs[-1]["content"]["data"]["text/plain"], "42")

    def test_interrupt_a_busy_loop(self):
        self.interrupt('System.out.println("on"); while (true) { }', "stream")

    def test_interrupt_a_sleeping_cell(self):
        self.interrupt('System.out.println("on"); Thread.sleep(600000);', "stream")

    def test_interrupt_a_loop_that_prints(self):
        self.interrupt("for (long i = 0; ; i++) System.out.println(i);", "stream")

    def test_interrupt_a_sentence(self):
        self.interrupt("%wait", "execute_input")

    def test_interrupt_without_a_cell_does_no_harm(self):
        # Its reply is waited for: the channels are independent, and it must not meet the next cell.
        request = self.kc.session.msg("interrupt_request", {})
        self.kc.control_channel.send(request)
        self.assertEqual(self.reply_to(request["header"]["msg_id"], "control")["content"], {"status": "ok"})
        reply, _ = self.run_cell("1+1")
        self.assertEqual(reply["status"], "ok")

    def test_a_page_without_the_plotting_library_gets_it_over_a_comm(self):
        content = {"comm_id": "page-1", "target_name": "ladderwell.library", "data": {}}
        request = self.kc.session.msg("comm_open", content)
        self.kc.shell_channel.send(request)
        while True:  # the base library's own idle may overtake it
            answer = self.kc.get_iopub_msg(timeout=PATIENCE)
            if answer["msg_type"] == "comm_msg":
                break
        self.assertEqual(answer["content"]["comm_id"], "page-1")
        self.assertIn("ladderwellPlayer", answer["content"]["data"]["script"])
        self.kc.shell_channel.send(self.kc.session.msg("comm_close", {"comm_id": "page-1", "data": {}}))

    def test_streams_keep_their_order(self):
        code = 'for (int i = 0; i < 50; i++) { System.out.println("o" + i); System.err.println("e" + i); }'
        _, outputs = self.run_cell(code)
        both = "".join(m["content"]["text"] for m in outputs if m["msg_type"] == "stream")
        self.assertEqual(both, "".join("o%d\ne%d\n" % (i, i) for i in range(50)))

    def test_displays_stand_between_prints(self):
        _, outputs = self.run_cell('System.out.print("a"); display(1); System.out.print("b"); 2')
        kinds = [m["msg_type"] for m in outputs]
        self.assertEqual(kinds, ["execute_input", "stream", "display_data", "stream", "execute_result"])

    def test_many_prints_make_few_messages(self):
        begin = time.time()
        _, outputs = self.run_cell("for (int i = 0; i < 100000; i++) System.out.println(i);")
        print("measured: 1e5 prints in %.2f s and %d messages" % (time.time() - begin, len(outputs)))
        self.assertEqual(self.texts(outputs), "".join("%d\n" % i for i in range(100000)))
        self.assertLess(len(outputs), 400)

    def test_characters_of_every_length(self):
        text = "é ħ ∣ψ⟩ ⁵ 🌡 " * 3000
        _, outputs = self.run_cell(
            'for (int i = 0; i < 3000; i++) System.out.print("é ħ ∣ψ⟩ ⁵ 🌡 ");'
        )
        self.assertEqual(self.texts(outputs), text)
        msg_id = self.kc.complete('String s = "🌡"; Math.hyp', cursor_pos=24)
        content = self.reply_to(msg_id)["content"]
        self.assertEqual((content["matches"], content["cursor_start"], content["cursor_end"]), (["hypot("], 21, 24))
        kind = content["metadata"]["_jupyter_types_experimental"][0]
        self.assertEqual(kind, {"text": "hypot(", "type": "function", "start": 21, "end": 24})

    def test_late_prints_are_not_lost(self):
        msg_id = self.kc.execute(
            'new Thread(() -> { try { Thread.sleep(400); } catch (InterruptedException e) { } System.out.println("late"); }).start();'
        )
        self.reply_to(msg_id)
        while True:
            msg = self.kc.get_iopub_msg(timeout=PATIENCE)
            if msg["msg_type"] == "stream":
                self.assertEqual(msg["content"]["text"], "late\n")
                self.assertEqual(msg["parent_header"]["msg_id"], msg_id)
                break

    def test_errors_in_threads_of_a_cell_are_printed(self):
        _, outputs = self.run_cell("Thread t = new Thread(() -> { int i = 1 / 0; }); t.start(); t.join(); Thread.sleep(200);")
        self.assertIn("java.lang.ArithmeticException: / by zero", self.texts(outputs, "stderr"))

    def test_tracebacks_name_cell_and_line(self):
        reply, outputs = self.run_cell("int a = 0;\n\nint b = 1 / a;")
        self.assertEqual(reply["ename"], "java.lang.ArithmeticException")
        self.assertEqual(reply["evalue"], "/ by zero")
        self.assertIn("at cell [%d], line 3" % reply["execution_count"], reply["traceback"][-1])
        self.assertEqual(outputs[-1]["content"]["traceback"], reply["traceback"])

    def test_update_display(self):
        _, outputs = self.run_cell('display(1, "spot"); updateDisplay(2, "spot");')
        shown, updated = outputs[1:]
        self.assertEqual(shown["msg_type"], "display_data")
        self.assertEqual(updated["msg_type"], "update_display_data")
        for msg, text in ((shown, "1"), (updated, "2")):
            self.assertEqual(msg["content"]["transient"], {"display_id": "spot"})
            self.assertEqual(msg["content"]["data"]["text/plain"], text)

    def test_json_forms_are_json(self):
        _, outputs = self.run_cell("List.of(1, 2, 3)")
        self.assertEqual(outputs[-1]["content"]["data"]["application/json"], {"size": 3})

    def test_inspect(self):
        msg_id = self.kc.inspect("Math.hypot(3, 4)", cursor_pos=7, detail_level=1)
        content = self.reply_to(msg_id)["content"]
        self.assertTrue(content["found"])
        self.assertIn("hypot(double x, double y)", content["data"]["text/plain"])
        msg_id = self.kc.inspect("%count n: 1", cursor_pos=3)
        self.assertIn("a whole number", self.reply_to(msg_id)["content"]["data"]["text/plain"])
        msg_id = self.kc.inspect("nothing of that name", cursor_pos=3)
        content = self.reply_to(msg_id)["content"]
        self.assertEqual((content["status"], content["found"]), ("ok", False))

    def test_comm_info(self):
        reply = self.reply_to(self.kc.comm_info())
        self.assertEqual(reply["content"], {"status": "ok", "comms": {}})

    def test_a_bad_signature_is_ignored(self):
        key, self.kc.session.key = self.kc.session.key, b"wrong"
        for _ in range(3):
            bad = self.kc.execute("int forged = 1;")
            self.kc.session.send(self.kc.control_channel.socket, "kernel_info_request", {})
        self.kc.session.key = key
        reply, _ = self.run_cell("forged")
        self.assertEqual(reply["status"], "error")
        control = self.kc.session.msg("kernel_info_request", {})
        self.kc.control_channel.send(control)
        answer = self.reply_to(control["header"]["msg_id"], "control")
        self.assertEqual(answer["content"]["status"], "ok")
        self.assertEqual(answer["msg_type"], "kernel_info_reply")

    def test_unreadable_messages_are_ignored(self):
        session = self.kc.session
        for content in ({"code": 5, "silent": []}, {}, {"code": None}):
            session.send(self.kc.shell_channel.socket, "execute_request", content)
        session.send(self.kc.shell_channel.socket, "history_request", {"hist_access_type": "nonsense"})
        session.send(self.kc.shell_channel.socket, "no_such_request", {})
        deadline = time.time() + PATIENCE
        while time.time() < deadline:
            reply, outputs = self.run_cell("3+4")
            if reply["status"] == "ok":
                break
        self.assertEqual(outputs[-1]["content"]["data"]["text/plain"], "7")

    def test_bad_cells_leave_the_kernel_alive(self):
        for code in (
            "",
            "   \n",
            "%",
            "%nonsense",
            "%break",
            "%%nonsense",
            "int deep(int n) { return deep(n + 1) + 1; }\ndeep(0)",
            "throw new NoClassDefFoundError();",
            "throw new OutOfMemoryError();",
            "new Object() { public String toString() { throw new RuntimeException(); } }",
            "\x00",
            "java.util.stream.Stream.of(1).map(x -> x / 0).toList()",
        ):
            self.assertIn(self.run_cell(code)[0]["status"], ("ok", "error"), code)
        reply, outputs = self.run_cell("2*21")
        self.assertEqual(outputs[-1]["content"]["data"]["text/plain"], "42")

    def test_exit_in_a_cell_does_not_end_the_kernel(self):
        reply, _ = self.run_cell("System.exit(3);")
        self.assertEqual(reply["status"], "error")
        self.assertIn("System.exit(3)", reply["evalue"])
        self.assertEqual(self.run_cell("1+1")[0]["status"], "ok")

    def test_dates_can_be_read(self):
        msg_id = self.kc.execute("1")
        reply = self.reply_to(msg_id)
        self.assertTrue(hasattr(reply["header"]["date"], "year"), reply["header"]["date"])
        self.outputs_of(msg_id)

    def test_declared_names_survive_failed_cells(self):
        self.run_cell("%count kept: 5")
        for code in ("%count kept: 6\n%nonsense", "%count kept: 7\nint q = 1 / 0;", "kept = 8; int q = 1 / 0;"):
            self.assertEqual(self.run_cell(code)[0]["status"], "error")
            _, outputs = self.run_cell("%count copy: kept plus 0")
            self.assertEqual(outputs[-1]["content"]["data"]["text/plain"], "5")
            _, outputs = self.run_cell("kept + 0")
            self.assertEqual(outputs[-1]["content"]["data"]["text/plain"], "5")


class LifeTests(unittest.TestCase):
    def test_the_first_sentence_and_the_first_java(self):
        begin = time.time()
        km, kc = start_new_kernel(kernel_name="ladderwell-test")
        try:
            ready = time.time()
            self.assertEqual(kc.execute_interactive("%count n: 3", timeout=PATIENCE, output_hook=lambda m: None)["content"]["status"], "ok")
            sentence = time.time()
            shown = []
            kc.execute_interactive("n + 1", timeout=PATIENCE, output_hook=lambda m: shown.append(m))
            java = time.time()
            self.assertIn("4", [m["content"]["data"]["text/plain"] for m in shown if m["msg_type"] == "execute_result"])
            print("measured: ready %.2f s, first sentence +%.3f s, first Java +%.2f s" % (ready - begin, sentence - ready, java - sentence))
        finally:
            kc.stop_channels()
            km.shutdown_kernel()

    def test_a_busy_kernel_shuts_down(self):
        km, kc = start_new_kernel(kernel_name="ladderwell-test")
        kc.execute("while (true) { }")
        time.sleep(2)
        begin = time.time()
        km.shutdown_kernel()
        print("measured: busy kernel shut down in %.2f s" % (time.time() - begin))
        kc.stop_channels()
        self.assertFalse(km.is_alive())


if __name__ == "__main__":
    unittest.main()
