"""Marks laid over the pages of a finished PDF, as artifacts: the stamp of a superseded or void copy, the sheet numbers of a bound set."""

import io
import json

from ..errors import ReportError

_OVERLAY = """
#let pages = json(bytes(sys.inputs.at("pages")))
#set text(font: "Libertinus Serif", lang: "en")
#for p in pages {
  set page(width: p.width * 1pt, height: p.height * 1pt, margin: 0pt, fill: none)
  if p.stamp != "" {
    place(center + horizon, rotate(-52deg, text(size: 58pt, weight: "bold", fill: rgb(178, 34, 34, 70), tracking: 0.06em, p.stamp)))
    place(top + center, dy: 14pt, rect(stroke: 1pt + rgb("#8a2b1e"), inset: 4pt, fill: white,
      text(size: 9pt, fill: rgb("#8a2b1e"), weight: "bold", p.line)))
  } else {
    place(bottom + right, dx: -0.75in, dy: -0.2in, text(size: 7.5pt, weight: "semibold", p.line))
  }
  pagebreak(weak: true)
}
"""


def stamped(path, kind, reason):
    """Return the bytes of a copy of a PDF with its status across every sheet and the reason on top.

    Parameters
    ----------
    path : the issued PDF; it is only read. kind : "superseded" or "void". reason : sentence, printed behind the word.

    Raises
    ------
    ReportError
        The PDF cannot be read.
    """
    import pikepdf

    line = f"{kind.upper()} {reason}" if len(reason) < 90 else f"{kind.upper()} {reason[:88]}…"
    with pikepdf.open(path) as pdf:
        overlay(pdf, [{"stamp": kind.upper(), "line": line}] * len(pdf.pages))
        with pdf.open_metadata(set_pikepdf_as_editor=False, update_docinfo=True) as said:
            said["dc:title"] = f"{kind.upper()}: {said.get('dc:title', path.stem)}"
        return saved(pdf)


def overlay(pdf, marks):
    """Lay a mark over each page of an open PDF: {"stamp", "line"} of texts; without a stamp the line goes to the foot.

    The marks are artifacts, so that a reading device passes them over and the tagged text stays as it was.
    """
    import pikepdf

    sizes = [[float(value) for value in page.mediabox] for page in pdf.pages]
    pages = [mark | {"width": box[2] - box[0], "height": box[3] - box[1]} for mark, box in zip(marks, sizes)]
    with pikepdf.open(io.BytesIO(_set(pages))) as made:
        for page, over in zip(pdf.pages, made.pages):
            form = pdf.copy_foreign(over.as_form_xobject())
            # A name of its own choosing would be random.
            name = page.add_resource(form, pikepdf.Name.XObject, name=pikepdf.Name("/GagelineMark"))
            page.contents_add(b"q\n", prepend=True)
            page.contents_add(b"Q\n/Artifact BMC\nq\n" + str(name).encode() + b" Do\nQ\nEMC\n")


def _set(pages):
    import typst

    from ..sheet.build import fonts

    try:
        pdf, warnings = typst.compile_with_warnings(_OVERLAY.encode(), font_paths=fonts(), ignore_system_fonts=True, format="pdf",
                                                    pdf_tags=False, timestamp=0, sys_inputs={"pages": json.dumps(pages)})
    except typst.TypstError as error:
        raise ReportError(f"the stamp could not be set: {error.message}") from None
    if warnings:
        raise ReportError(f"the stamp could not be set: {warnings[0].message}")
    return pdf


def saved(pdf):
    """Return an open PDF's bytes; the same PDF gives the same bytes."""
    import pikepdf

    out = io.BytesIO()
    pdf.save(out, deterministic_id=True, object_stream_mode=pikepdf.ObjectStreamMode.preserve)
    return out.getvalue()
