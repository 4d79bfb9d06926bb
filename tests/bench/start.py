"""How soon a cold page shows its first survival curve, beside a plain page of stock Pyodide.

Run as ``python tests/bench/start.py`` after a build. Prints; asserts nothing about time. Both pages
come from the same server on this machine and open in a fresh browser each time, turn about:

- ours: from the address to the survival curve of the demo register, drawn;
- plain: from the address until Pyodide is loaded, numpy, scipy and pandas are loaded from whole
  wheels, and numpy, scipy.special and pandas are imported. It draws nothing.

Memory is the largest resident set of the renderer process, as Linux keeps it.
"""

from __future__ import annotations

import argparse
import json
import os
import shutil
import statistics
import sys
import tempfile
from collections.abc import Callable, Iterator
from contextlib import contextmanager
from dataclasses import dataclass
from pathlib import Path

HOUSE = Path(__file__).parents[2]
sys.path[:0] = [str(HOUSE / "core"), str(HOUSE / "build_scripts")]

from playwright.sync_api import Browser, Page, sync_playwright
from pyodide_lock import PyodideLockSpec

from browsers import chromium
from engine_pack import RUNTIME
from make_dist import DIST
from site_server import SiteServer
from wheels import engine_wheels

LIMIT_MS = 180_000
GOAL = 0.65
STOCK = ["numpy", "scipy", "pandas"]
PLAIN_PAGE = """<!doctype html><title>plain</title><script type="module">
import { loadPyodide } from './pyodide.mjs';
const python = await loadPyodide({ indexURL: './' });
await python.loadPackage(['numpy', 'scipy', 'pandas']);
python.runPython('import numpy, scipy.special, pandas');
document.title = 'ready';
</script>"""

STAGES = """
window.stages = [];
new MutationObserver(() => {
  const bar = document.getElementById('engine-progress');
  const name = bar ? bar.dataset.stage : 'ready';
  if (document.body && window.stages.at(-1)?.[0] !== name) window.stages.push([name, performance.now()]);
}).observe(document, { subtree: true, childList: true, attributes: true });
"""
"""Notes in the page itself when each stage of the start begins."""


@dataclass(frozen=True)
class Run:
    """One opening: seconds, bytes served, peak memory of the renderer in bytes."""

    seconds: float
    bytes: int
    memory: int
    stages: list[tuple[str, float]]


class CountingServer(SiteServer):
    """A site server that adds up the bodies it has sent."""

    def sent(self, folder: Path) -> int:
        """Return the bytes of every file that was asked for."""
        names = [path.split("?")[0].lstrip("/") or "index.html" for _, path in self.requests]
        return sum((folder / name).stat().st_size for name in names if (folder / name).is_file())


@contextmanager
def fresh_browser() -> Iterator[Browser]:
    """Open a browser that has nothing in its cache."""
    arguments = ["--disable-background-networking", "--disable-component-update", "--disable-sync"]
    if os.geteuid() == 0:
        arguments.append("--no-sandbox")
    with sync_playwright() as playwright:
        browser = playwright.chromium.launch(executable_path=chromium(), args=arguments)
        yield browser
        browser.close()


def peak_memory(browser: Browser) -> int:
    """Return the largest resident set of any renderer so far."""
    session = browser.new_browser_cdp_session()
    processes = session.send("SystemInfo.getProcessInfo")["processInfo"]
    peaks = []
    for process in processes:
        if process["type"] == "renderer":
            status = Path(f"/proc/{process['id']}/status").read_text(encoding="utf-8")
            peaks += [int(line.split()[1]) * 1024 for line in status.splitlines() if line.startswith("VmHWM")]
    return max(peaks)


def opened(folder: Path, finish: Callable[[Page], float]) -> Run:
    """Open a folder's page in a fresh browser and let ``finish`` say when it was done."""
    server = CountingServer(folder)
    server.start()
    with fresh_browser() as browser:
        page = browser.new_page()
        page.set_default_timeout(LIMIT_MS)
        page.add_init_script(STAGES)
        page.goto(server.address)
        milliseconds = finish(page)
        stages = [(name, at / 1000) for name, at in page.evaluate("window.stages")]
        run = Run(milliseconds / 1000, server.sent(folder), peak_memory(browser), stages)
    server.shutdown()
    return run


def plain_ready(page: Page) -> float:
    """Wait for the plain page."""
    return page.wait_for_function("() => document.title === 'ready' && performance.now()").json_value()


def first_curve(page: Page) -> float:
    """Open the demo register as soon as that is possible, and wait for its curve."""
    return page.evaluate(
        """() => new Promise((drawn) => {
          location.hash = 'outcomes';
          const look = () => {
            const demo = document.getElementById('open-demo');
            if (demo && !demo.disabled && !demo.dataset.pressed) {
              demo.dataset.pressed = 'yes';
              demo.click();
            }
            if (document.querySelector('#survival svg')) drawn(performance.now());
            else requestAnimationFrame(look);
          };
          look();
        })"""
    )


def plain_folder(folder: Path) -> Path:
    """Put stock Pyodide and its whole wheels beside a page that loads them."""
    lock = PyodideLockSpec.from_json(RUNTIME / "pyodide-lock.json")
    names: list[str] = []
    for name in STOCK:
        names += [each for each in [name, *_needed(lock, name)] if each not in names]
    for file in (
        "pyodide.mjs",
        "pyodide.asm.mjs",
        "pyodide.asm.wasm",
        "python_stdlib.zip",
        "pyodide-lock.json",
    ):
        shutil.copy(RUNTIME / file, folder / file)
    for wheel in engine_wheels(RUNTIME, names):
        shutil.copy(wheel, folder / wheel.name)
    (folder / "index.html").write_text(PLAIN_PAGE, encoding="utf-8")
    return folder


def _needed(lock: PyodideLockSpec, name: str) -> list[str]:
    direct = lock.packages[name].depends
    return [*direct, *[each for other in direct for each in _needed(lock, other)]]


def main() -> None:
    """Print each run and the ratio of the medians."""
    asked = argparse.ArgumentParser(description=__doc__.splitlines()[0])
    asked.add_argument("--runs", type=int, default=3)
    asked.add_argument("--dist", type=Path, default=DIST)
    options = asked.parse_args()
    found: dict[str, list[Run]] = {"ours": [], "plain": []}
    with tempfile.TemporaryDirectory() as name:
        plain = plain_folder(Path(name))
        for _ in range(options.runs):
            for kind, folder, finish in (
                ("ours", options.dist / "site", first_curve), ("plain", plain, plain_ready),
            ):  # fmt: skip
                found[kind].append(opened(folder, finish))
                print(kind, json.dumps(_written(found[kind][-1])), flush=True)
    middle = {kind: statistics.median(run.seconds for run in runs) for kind, runs in found.items()}
    print(f"first curve {middle['ours']:.2f} s, plain page {middle['plain']:.2f} s: "
          f"ratio {middle['ours'] / middle['plain']:.2f} (goal: at most {GOAL})")  # fmt: skip


def _written(run: Run) -> dict[str, object]:
    return {
        "seconds": round(run.seconds, 2),
        "megabytes": round(run.bytes / 1e6, 1),
        "peak_memory_megabytes": round(run.memory / 1e6),
        "stages": {name: round(at, 2) for name, at in run.stages if name},
    }


if __name__ == "__main__":
    main()
