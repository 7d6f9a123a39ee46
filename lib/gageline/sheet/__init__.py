"""Notebook to calculation sheet: blocks in, one archival PDF out; the heavy imports stand inside the functions."""

from .blocks import SHEET_MIME, mimebundle
from .build import build_pdf, write_pdf

__all__ = ["SHEET_MIME", "build_pdf", "mimebundle", "write_pdf"]
