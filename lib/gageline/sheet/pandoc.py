"""The one door to pandoc, which runs as a process of its own: strict, offline, at most twice for a document."""

import functools
import json
import subprocess

from ..errors import ReportError

API_VERSION = [1, 23, 1]  # of pandoc's JSON document; stands since pandoc 3.0


@functools.cache
def _program():
    try:
        import pypandoc

        return pypandoc.get_pandoc_path()
    except (ImportError, OSError):
        raise ReportError("pandoc is missing: install the package pypandoc_binary.") from None


def run(text, reader, writer):
    """Return what pandoc makes of text, and its complaint; where there is one, the output is not to be used."""
    command = [_program(), "--from", reader, "--to", writer, "--wrap=none", "--fail-if-warnings", "--sandbox"]
    done = subprocess.run(command, input=text.encode(), capture_output=True, check=False)
    return done.stdout.decode(), done.stderr.decode().strip() if done.returncode else ""


def document(blocks):
    """Return pandoc's JSON document of these blocks as text."""
    return json.dumps({"pandoc-api-version": API_VERSION, "meta": {}, "blocks": blocks})
