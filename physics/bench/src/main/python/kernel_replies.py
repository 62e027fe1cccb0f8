"""Replies of the Ladderwell kernel against ipykernel importing numpy and scipy: same client, taken in turn, ratios of medians."""

import argparse
import statistics
import sys
import time

from jupyter_client.manager import KernelManager

DECLARATIONS = """%%declare
oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz
state psi: coherent in trap, mean 100
evolve run: psi for 3 periods, frames 120
"""
WORK = """%%declare
oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz
state psi: coherent in trap, mean 100
evolve run: psi for 3 periods, frames 120
table run: position, spread of position, energy, return probability
"""
IMPORTS = "import numpy, scipy, scipy.linalg\n1+1"


class Session:
    """One running kernel and its client."""

    def __init__(self, name, first):
        start = time.perf_counter()
        self.manager = KernelManager(kernel_name=name)
        self.manager.start_kernel()
        self.client = self.manager.client()
        self.client.start_channels()
        self.client.wait_for_ready(timeout=60)
        self.execute(first)
        self.first = time.perf_counter() - start

    def execute(self, code):
        """Sends a cell and waits for its reply; returns the seconds between."""
        start = time.perf_counter()
        request = self.client.execute(code)
        while True:
            reply = self.client.get_shell_msg(timeout=60)
            if reply["parent_header"].get("msg_id") == request:
                break
        taken = time.perf_counter() - start
        if reply["content"]["status"] != "ok":
            sys.exit(f"the cell failed: {reply['content']}")
        while True:  # the outputs too, so that none waits in the queue of the next cell
            message = self.client.get_iopub_msg(timeout=60)
            if message["msg_type"] == "status" and message["content"]["execution_state"] == "idle":
                if message["parent_header"].get("msg_id") == request:
                    return taken

    def close(self):
        self.client.stop_channels()
        self.manager.shutdown_kernel(now=True)


def first_reply(name, code):
    session = Session(name, code)
    session.close()
    return session.first


def row(what, ours, theirs, goal):
    ratio = statistics.median(ours) / statistics.median(theirs)
    pairs = sorted(a / b for a, b in zip(ours, theirs))
    met = "met" if ratio <= goal else "NOT MET"
    print(f"{what:<58} {ratio:6.2f} ({pairs[0]:.2f} to {pairs[-1]:.2f})   goal {goal:4.2f}  {met}")


def main():
    arguments = argparse.ArgumentParser(description=__doc__)
    arguments.add_argument("--rounds", type=int, default=5)
    rounds = arguments.parse_args().rounds
    python, sentences, java = [], [], []
    for _ in range(rounds):
        python.append(first_reply("python3", IMPORTS))
        sentences.append(first_reply("ladderwell", DECLARATIONS))
        java.append(first_reply("ladderwell", "1+1"))
    print(f"ratios ours / ipykernel, median of {rounds} (range of pairs)")
    row("first reply, cell of declarations", sentences, python, 0.6)
    row("first reply, Java cell", java, python, 1.0)
    theirs = Session("python3", IMPORTS)
    ours = Session("ladderwell", "1+1")
    time.sleep(12)  # the practice in the background comes to its end
    for _ in range(60):
        ours.execute(WORK)
        ours.execute("1+1")
    one_theirs, one_ours, work = [], [], []
    for _ in range(60):
        one_theirs.append(theirs.execute("1+1"))
        one_ours.append(ours.execute("1+1"))
        work.append(ours.execute(WORK))
    row("1+1, warm", one_ours, one_theirs, 1.5)
    row("declare + evolve + table at 100 quanta, warm, against our 1+1", work, one_ours, 5.0)
    theirs.close()
    ours.close()


if __name__ == "__main__":
    main()
