"""Every sentence has its words in every language, and no words for people stand anywhere else."""

from __future__ import annotations

import ast
import re
from pathlib import Path

import pytest
from fluent.syntax import FluentParser
from fluent.syntax import ast as ftl
from fluent.syntax.visitor import Visitor

HOUSE = Path(__file__).parents[2]
WORDS = HOUSE / "web" / "words"
SCRIPTS = sorted(path for path in (HOUSE / "web" / "scripts").rglob("*.js"))
LANGUAGES = sorted(path.stem for path in WORDS.glob("*.ftl"))


class _Variables(Visitor):
    def __init__(self) -> None:
        self.names: set[str] = set()

    def visit_VariableReference(self, node: ftl.VariableReference) -> None:
        self.names.add(node.id.name)


def _messages(language: str) -> dict[str, set[str]]:
    """Return each key of a language with the parameters that its sentence uses."""
    resource = FluentParser().parse((WORDS / f"{language}.ftl").read_text(encoding="utf-8"))
    messages: dict[str, set[str]] = {}
    for entry in resource.body:
        assert not isinstance(entry, ftl.Junk), f"{language}: cannot be read: {entry.content[:80]!r}"
        if isinstance(entry, ftl.Message):
            assert entry.id.name not in messages, f"{language}: {entry.id.name} stands twice"
            variables = _Variables()
            variables.visit(entry)
            messages[entry.id.name] = variables.names
    return messages


ENGLISH = _messages("en")


@pytest.mark.parametrize("language", LANGUAGES)
def test_every_language_has_the_same_keys_and_parameters(language: str) -> None:
    messages = _messages(language)
    assert sorted(messages) == sorted(ENGLISH)
    differing = {key for key in ENGLISH if messages[key] != ENGLISH[key]}
    assert not differing


def _engine_codes(kind: str) -> set[str]:
    """Return the codes that the engine gives to ``Refusal`` or ``Caution`` as literal strings."""
    codes = set()
    for path in (HOUSE / "core" / "vitalroll").rglob("*.py"):
        for node in ast.walk(ast.parse(path.read_text(encoding="utf-8"))):
            if isinstance(node, ast.Call) and getattr(node.func, "id", "") == kind and node.args:
                first = node.args[0]
                if isinstance(first, ast.Constant):
                    codes.add(first.value)
    return codes


@pytest.mark.parametrize("kind", ["Refusal", "Caution"])
def test_every_code_of_the_engine_has_a_sentence(kind: str) -> None:
    codes = _engine_codes(kind)
    assert codes
    missing = {code for code in codes if f"{kind.lower()}-{code}" not in ENGLISH}
    assert not missing


_SAID = re.compile(r"\bsay\(\s*(?:'([^']+)'|`([^`]+)`)")


def test_every_key_the_page_says_exists() -> None:
    missing = set()
    for path in SCRIPTS:
        for plain, template in _SAID.findall(path.read_text(encoding="utf-8")):
            if plain and plain not in ENGLISH:
                missing.add((path.name, plain))
            if template:
                pattern = re.compile(re.sub(r"\\\$\\\{.*?\\\}", "[a-zA-Z0-9_-]+", re.escape(template)) + "$")
                if not any(pattern.match(key) for key in ENGLISH):
                    missing.add((path.name, template))
    assert not missing


def test_no_words_for_people_in_the_scripts() -> None:
    """Two ordinary words in one string are a sentence; messages for developers go to the console."""
    text = re.compile(r"'([^'\n]*)'|\"([^\"\n]*)\"|`([^`]*)`")
    sentence = re.compile(r"^[A-ZÀ-Ý]?[a-zà-ÿ’]{2,}( [a-zà-ÿ’]{2,}){2,}")
    for_developers = re.compile(r"console\.|new (Type|Range)?Error\(|^\s*(\*|//|/\*)")
    found = []
    for path in SCRIPTS:
        for number, line in enumerate(path.read_text(encoding="utf-8").splitlines(), 1):
            if for_developers.search(line):
                continue
            for groups in text.findall(line):
                if sentence.match("".join(groups)):
                    found.append(f"{path.name}:{number}: {''.join(groups)}")
    assert not found


def test_no_words_for_people_in_the_template() -> None:
    template = (HOUSE / "web" / "index.html").read_text(encoding="utf-8")
    outside_tags = re.sub(r"<!--.*?-->|<[^>]*>", " ", template, flags=re.DOTALL)
    assert set(outside_tags.split()) <= {"Vitalroll"}


def test_no_words_for_people_in_the_engine() -> None:
    """Refusals and cautions carry codes: lower-case words joined by underscores."""
    for kind in ("Refusal", "Caution"):
        assert all(re.fullmatch(r"[a-z][a-z0-9_]*", code) for code in _engine_codes(kind))
