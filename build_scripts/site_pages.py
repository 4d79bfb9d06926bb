"""The page: scripts and styles bundled, put into the template together with the pack's manifest."""

from __future__ import annotations

import base64
import hashlib
import html
import json
import subprocess
from dataclasses import dataclass
from pathlib import Path

from engine_pack import Member, manifest
from environment import HOUSE

WEB = HOUSE / "web"
POLICIES = json.loads((WEB / "scripts" / "engine" / "policy.json").read_text(encoding="utf-8"))
NO_SCRIPT_KEY = "needs-javascript"


@dataclass(frozen=True)
class Bundle:
    """The page's script and style as text."""

    script: str
    style: str


def bundle(work: Path) -> Bundle:
    """Bundle the page's modules and styles."""
    # The package puts its native program in place of its script, so it is run as it is.
    esbuild = WEB / "node_modules" / ".bin" / "esbuild"
    script, style = work / "page.js", work / "page.css"
    sheets = sorted((WEB / "styles").glob("*.css"), key=lambda path: (path.name != "page.css", path.name))
    entry = work / "styles.css"
    entry.write_text("\n".join(path.read_text(encoding="utf-8") for path in sheets), encoding="utf-8")
    common = [str(esbuild), "--bundle", "--minify", "--charset=utf8", "--log-level=warning"]
    subprocess.run(
        [
            *common,
            "--loader:.ftl=text",
            "--format=iife",
            "--target=es2022",
            "--legal-comments=none",
            f"--outfile={script}",
            str(WEB / "scripts" / "main.js"),
        ],
        check=True,
    )
    subprocess.run([*common, str(entry), f"--outfile={style}"], check=True)
    return Bundle(script.read_text(encoding="utf-8"), style.read_text(encoding="utf-8"))


def write_site(folder: Path, page: Bundle, members: list[Member], licences: str) -> None:
    """Write the site for any static host: index.html, and the rest under names that change with content."""
    assets = folder / "assets"
    assets.mkdir(parents=True)
    for member in members:
        (folder / member.file).write_bytes(member.packed)
    script, style = _named("page", "js", page.script), _named("page", "css", page.style)
    (folder / script).write_text(page.script, encoding="utf-8")
    (folder / style).write_text(page.style, encoding="utf-8")
    (folder / "licences.txt").write_text(licences, encoding="utf-8")
    text = fill(
        policy=POLICIES["site"],
        styles=f'<link rel="stylesheet" href="{style}" integrity="{integrity(page.style)}">',
        script=f'<script src="{script}" integrity="{integrity(page.script)}" defer></script>',
        pack=f'<script type="application/json" id="pack">{json.dumps(manifest(members))}</script>',
    )
    (folder / "index.html").write_text(text, encoding="utf-8")


def write_one_file(path: Path, page: Bundle, members: list[Member], licences: str) -> None:
    """Write the one-file copy: the same page with the pack inside, its scripts allowed by their hash."""
    inside = "\n".join(
        f'<script type="application/octet-stream" id="pack-{member.name}">'
        f"{base64.b64encode(member.packed).decode()}</script>"
        for member in members
    )
    script = page.script.replace("</script", "<\\/script")
    text = fill(
        policy=POLICIES["one_file"].replace("{hashes}", f"'{integrity(script)}'"),
        styles=f"<style>{page.style}</style>",
        script=f"<script>{script}</script>",
        pack=f'<script type="application/json" id="pack">{json.dumps(manifest(members))}</script>\n{inside}',
    )
    address = "data:text/plain;charset=utf-8;base64," + base64.b64encode(licences.encode()).decode()
    text = text.replace(
        'href="licences.txt" target="_blank" rel="noopener"', f'href="{address}" download="licences.txt"'
    )
    path.write_text(text, encoding="utf-8")


def fill(*, policy: str, styles: str, script: str, pack: str) -> str:
    """Return the template with each of its marks replaced."""
    text = (WEB / "index.html").read_text(encoding="utf-8")
    meta = f'<meta http-equiv="Content-Security-Policy" content="{html.escape(policy)}">'
    marks = {"policy": meta, "styles": styles, "no-script": _no_script(), "pack": pack, "script": script}
    for name, content in marks.items():
        mark = f"<!-- build: {name} -->"
        assert text.count(mark) == 1, f"web/index.html must hold {mark} once"
        text = text.replace(mark, content)
    return text


def _no_script() -> str:
    """Return the sentence for a browser without JavaScript, in every language there is."""
    sentences = []
    for words in sorted((WEB / "words").glob("*.ftl")):
        for line in words.read_text(encoding="utf-8").splitlines():
            if line.startswith(f"{NO_SCRIPT_KEY} = "):
                sentences.append(f'<span lang="{words.stem}">{html.escape(line.split(" = ", 1)[1])}</span>')
    return " ".join(sentences)


def integrity(text: str) -> str:
    """Return the integrity value of a text as the browser computes it."""
    return "sha256-" + base64.b64encode(hashlib.sha256(text.encode()).digest()).decode()


def _named(name: str, ending: str, text: str) -> str:
    return f"assets/{name}-{hashlib.sha256(text.encode()).hexdigest()[:12]}.{ending}"
