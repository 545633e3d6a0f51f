"""A headless Chromium for tests, driven by the WebDriver protocol (W3C, WebDriver level 2)."""

from __future__ import annotations

import base64
import contextlib
import json
import os
import re
import shutil
import subprocess
from collections.abc import Iterator
from pathlib import Path
from typing import Any
from urllib.request import ProxyHandler, Request, build_opener

REQUIRED = "STORYLEDGER_REQUIRE_BROWSER"
#: the path of the accessibility rules, axe.min.js of the package axe-core
AXE = "STORYLEDGER_AXE"
#: the browser, its driver, and what reads the text of a printed page
PROGRAMS = ("chromium", "chromedriver", "pdftotext")
SWITCHES = (
    *("--headless", "--no-sandbox", "--disable-gpu", "--no-first-run", "--disable-sync"),
    *("--disable-background-networking", "--disable-component-update", "--disable-dev-shm-usage"),
)
#: the name of an element's reference in the protocol
_ELEMENT = "element-6066-11e4-a52e-4f735466cecf"
KEYS = {"Tab": "\ue004", "Enter": "\ue007", "Space": " "}
_open = build_opener(ProxyHandler({})).open


def missing() -> str:
    """Why there is no browser; empty where there is one."""
    absent = [name for name in PROGRAMS if shutil.which(name) is None]
    return f"not installed: {', '.join(absent)}" if absent else ""


def missing_rules() -> str:
    """Why there are no accessibility rules; empty where there are."""
    path = os.environ.get(AXE, "")
    return "" if path and Path(path).is_file() else f"{AXE} names no axe.min.js"


class Browser:
    """One window; ``profile`` is a new folder for what the browser keeps."""

    def __init__(self, driver: str, profile: Path) -> None:
        self._driver, self._session = driver, ""
        options = {
            "binary": shutil.which("chromium"),
            "args": [*SWITCHES, f"--user-data-dir={profile / 'data'}"],
            "prefs": {"download.default_directory": str(profile)},
        }
        wanted = {"goog:chromeOptions": options, "goog:loggingPrefs": {"browser": "ALL"}}
        self._session = self._post("", {"capabilities": {"alwaysMatch": wanted}})["sessionId"]
        self.downloads = profile

    def _post(self, path: str, body: dict[str, Any]) -> Any:
        url = f"{self._driver}/session{f'/{self._session}' if self._session else ''}{path}"
        request = Request(url, json.dumps(body).encode(), {"Content-Type": "application/json"})
        with _open(request, timeout=60) as answer:
            return json.load(answer)["value"]

    def open(self, path: Path, width: int = 1280, height: int = 900) -> None:
        """Open a file in a window of a size, as a screen of that size shows it."""
        size = {"width": width, "height": height, "deviceScaleFactor": 1, "mobile": width < 600}
        self._post("/goog/cdp/execute", {"cmd": "Emulation.setDeviceMetricsOverride", "params": size})
        self._post("/url", {"url": path.as_uri()})

    def run(self, script: str, *arguments: Any) -> Any:
        """The value of a script, a function's body."""
        return self._post("/execute/sync", {"script": script, "args": list(arguments)})

    def wait_for(self, script: str) -> Any:
        """The value that a script hands to its last argument, a function."""
        return self._post("/execute/async", {"script": script, "args": []})

    def type(self, selector: str, text: str) -> None:
        """Type into an element (the path of a file into a field for files)."""
        element = self._post("/element", {"using": "css selector", "value": selector})[_ELEMENT]
        self._post(f"/element/{element}/value", {"text": text})

    def press(self, *keys: str) -> None:
        """Press keys one after another, wherever the focus is."""
        strokes = [
            {"type": kind, "value": KEYS.get(key, key)} for key in keys for kind in ("keyDown", "keyUp")
        ]
        self._post("/actions", {"actions": [{"type": "key", "id": "keyboard", "actions": strokes}]})

    def focused(self) -> str:
        """The element that has the focus: its name, and its identifier, target or text."""
        name = "e.id || e.getAttribute('href') || e.textContent.trim().slice(0, 40)"
        script = f"const e = document.activeElement; return `${{e.localName}} ${{{name}}}`"
        return str(self.run(script))

    def messages(self) -> list[str]:
        """What the console said since it was last asked."""
        return [entry["message"] for entry in self._post("/se/log", {"type": "browser"})]

    def pdf(self) -> bytes:
        """The page as it is printed on A4."""
        size = {"page": {"width": 21.0, "height": 29.7}, "background": True}
        return base64.b64decode(self._post("/print", size))

    def picture(self) -> bytes:
        """The window as a PNG."""
        url = f"{self._driver}/session/{self._session}/screenshot"
        with _open(url, timeout=60) as answer:
            return base64.b64decode(json.load(answer)["value"])

    def close(self) -> None:
        """End the browser."""
        request = Request(f"{self._driver}/session/{self._session}", method="DELETE")
        _open(request, timeout=30).close()


@contextlib.contextmanager
def browsing(profile: Path) -> Iterator[Browser]:
    """A browser for as long as the block runs."""
    driver = subprocess.Popen(
        [shutil.which("chromedriver") or "", "--port=0"],
        stdout=subprocess.PIPE,
        stderr=subprocess.DEVNULL,
        text=True,
    )
    try:
        assert driver.stdout
        found = next(
            match for line in driver.stdout if (match := re.search(r"successfully on port (\d+)", line))
        )
        browser = Browser(f"http://127.0.0.1:{found[1]}", profile)
        try:
            yield browser
        finally:
            browser.close()
    finally:
        driver.terminate()
        driver.wait(30)
        if driver.stdout:
            driver.stdout.close()
