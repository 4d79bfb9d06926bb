"""A small static server for the built site, on this machine only."""

from __future__ import annotations

import http.server
import threading
from pathlib import Path
from typing import ClassVar

TYPES = {
    ".html": "text/html; charset=utf-8",
    ".js": "text/javascript",
    ".css": "text/css",
    ".gz": "application/gzip",
}


class SiteHandler(http.server.SimpleHTTPRequestHandler):
    """Serves files as they are; the pack's members stay packed, so that any host does the same."""

    extensions_map: ClassVar[dict[str, str]] = {
        **http.server.SimpleHTTPRequestHandler.extensions_map,
        **TYPES,
    }

    def log_message(self, *arguments: object) -> None:
        """Keep the terminal quiet."""


class SiteServer(http.server.ThreadingHTTPServer):
    """Serves one folder on 127.0.0.1 and keeps a log of what was asked: ``requests`` holds (method, path).

    Parameters
    ----------
    folder : Path
    port : int
        0 for any free one; ``server_port`` tells which.
    """

    daemon_threads = True

    def __init__(self, folder: Path, port: int = 0) -> None:
        self.requests: list[tuple[str, str]] = []
        self._folder = str(folder)
        super().__init__(("127.0.0.1", port), self._handler)

    def _handler(self, request: object, address: object, server: object) -> SiteHandler:
        log = self.requests

        class Logged(SiteHandler):
            def parse_request(self) -> bool:
                understood = super().parse_request()
                if understood:
                    log.append((self.command, self.path))
                return understood

        return Logged(request, address, server, directory=self._folder)  # type: ignore[arg-type]

    @property
    def address(self) -> str:
        """Return the address of the site."""
        return f"http://127.0.0.1:{self.server_port}/"

    def start(self) -> SiteServer:
        """Serve in the background until ``shutdown``."""
        threading.Thread(target=self.serve_forever, daemon=True).start()
        return self
