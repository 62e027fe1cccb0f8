"""Debian's jupyter_kernel_test against the kernel named by JUPYTER_PATH."""
import unittest

import jupyter_kernel_test


class LadderwellKernelTests(jupyter_kernel_test.KernelTests):
    kernel_name = "ladderwell-test"
    language_name = "java"
    file_extension = ".java"
    code_hello_world = 'System.out.println("hello, world");'
    code_stderr = 'System.err.println("oops");'
    completion_samples = [
        {"text": "Math.hyp", "matches": {"hypot("}},
        {"text": "%cou", "matches": {"count"}},
    ]
    complete_code_samples = ["1+1", "int i = 3;", "void f() { }", "%count n: 3", "%%declare\ncount n: 3\n"]
    incomplete_code_samples = ["for (int i = 0; i < 3; i++) {", 'String s = """', "/* open", "%%declare\n"]
    invalid_code_samples = ["int i = )", "}"]
    code_generate_error = 'throw new IllegalStateException("on purpose");'
    code_execute_result = [
        {"code": "6*7", "result": "42"},
        {"code": 'List.of(1, 2, 3)', "result": "[1, 2, 3]"},
        {"code": 'List.of(1, 2)', "result": "<ul>2</ul>", "mime": "text/html"},
        {"code": "%count n: 12", "result": "12"},
    ]
    code_display_data = [{"code": "display(List.of(1))", "mime": "text/html"}]
    code_history_pattern = "6?7*"
    supported_history_operations = ("tail", "range", "search")
    code_inspect_sample = "Math.hypot"
    code_clear_output = "clearOutput(false)"


if __name__ == "__main__":
    unittest.main()
