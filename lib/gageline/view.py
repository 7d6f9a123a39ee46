"""The blocks of a report as HTML, so that a calculation reads in JupyterLab as it does on the sheet."""

import base64
import html

# JupyterLab drops style sheets of notebooks it does not trust yet and sets tables right-aligned; inline styles survive.
_LEFT = ' style="text-align:left;vertical-align:top"'
_ALIGN = {"left": _LEFT, "right": ' style="text-align:right;vertical-align:top"', "center": ' style="text-align:center;vertical-align:top"'}
_SMALL = ' style="color:#555;font-size:.88em"'


def to_html(blocks):
    """Return HTML of sheet blocks; equations are LaTeX that JupyterLab typesets.

    Parameters
    ----------
    blocks : list of blocks of ``sheet.blocks``.
    """
    return '<div style="max-width:60em">' + "".join(_KINDS[block["kind"]](block) for block in blocks if block["kind"] in _KINDS) + "</div>"


def _runs(runs):
    out = []
    for run in [runs] if isinstance(runs, str) else runs:
        if isinstance(run, str):
            # JupyterLab would set text between dollar signs as maths; an entity keeps what the user typed.
            out.append(html.escape(run).replace("$", "&#36;<wbr>"))
        elif "math" in run:
            out.append(rf"\({run['math']}\)")
        else:
            kind, text = next(iter(run.items()))
            tag = {"strong": "b", "emph": "i", "code": "code"}[kind]
            out.append(f"<{tag}>{html.escape(text)}</{tag}>")
    return "".join(out)


def _list(title, rows):
    return f"<p><b>{title}</b></p><ul>" + "".join(f"<li>{_runs(row)}</li>" for row in rows) + "</ul>" if rows else ""


def _cover(block):
    rows = "".join(f"<tr><td{_LEFT}>{_runs(key)}</td><td{_LEFT}>{_runs(value)}</td></tr>" for key, value in block["criteria"])
    taken = [[f"{a if isinstance(a, str) else a[0]}: ", *([t] if isinstance(t, str) else t), " (", *([b] if isinstance(b, str) else b), ")"]
             for a, t, b, _ in block["assumptions"]]
    return (f"<h2>{html.escape(block['title'])}</h2><p>{_runs(block['purpose'])}</p><p><b>{_runs(block['governing'])}</b></p>"
            f"<table>{rows}</table>" + _list("By others", block["scope"]["by_others"]) + _list("Assumptions", taken)
            + _list("Open items", block["open_items"]) + _list("Cautions", block["cautions"]))


def _table(block):
    align = [_ALIGN[column["align"]] for column in block["columns"]]
    head = "".join(f"<th{a}>{_runs(column['head'])}</th>" for a, column in zip(align, block["columns"]))
    body = ""
    for row in block["rows"]:
        cells = [f"<td{a}>{'<b>' if row['strong'] else ''}{_runs(cell)}{'</b>' if row['strong'] else ''}</td>" for a, cell in zip(align, row["cells"])]
        if row["span_reason"]:
            start, reason = row["span_reason"]
            cells.append(f'<td colspan="{len(align) - start}"{_LEFT}>{_runs(reason)}</td>')
        body += f"<tr>{''.join(cells)}</tr>"
    caption = f'<p{_SMALL}>{_runs(block["caption"])}</p>' if any(block["caption"]) else ""
    return f"<table><thead><tr>{head}</tr></thead><tbody>{body}</tbody></table>{caption}"


def _equation(block):
    rows = " \\\\ ".join(line["lhs"] + " &= " + r" \\ &= ".join([*line["rows"][:-2], " = ".join(line["rows"][-2:])]) for line in block["lines"])
    return (f'<div style="display:flex;justify-content:space-between;align-items:center;margin:.45em 0" role="math" '
            f'aria-label="{html.escape(block["alt"], quote=True)}"><div>\\(\\begin{{aligned}}{rows}\\end{{aligned}}\\)</div>'
            f'<div{_SMALL}>{html.escape(block["clause"])}</div></div>')


def _verdict(block):
    said = {True: "OK", False: "N.G.", None: ""}[block["ok"]]
    quotient = f"{html.escape(block['text'])} = " if block["text"] else ""
    ratio = f'{_runs(block["lhs"])} &emsp; D/C = {quotient}<b>{html.escape(block["ratio_text"])}</b>'
    return f'<div style="display:flex;justify-content:space-between;margin:.3em 0 1em"><span>{ratio}</span><b>{said}</b></div>'


def _figure(block):
    data = base64.b64encode(block["svg"].encode()).decode()
    return (f'<p><img style="width:{100 * block["width"]:.0f}%" alt="{html.escape(block["alt"], quote=True)}" src="data:image/svg+xml;base64,{data}"></p>'
            f'<p{_SMALL}>{_runs(block["caption"])}</p>')


def _rows(rows):
    return "<table>" + "".join("<tr>" + "".join(f"<td{_LEFT}>{_runs(cell)}</td>" for cell in row) + "</tr>" for row in rows) + "</table>"


_KINDS = {
    "cover": _cover,
    "heading": lambda b: f"<h{b['level'] + 1}>{_runs(b['text'])}</h{b['level'] + 1}>",
    "prose": lambda b: f"<p>{_runs(b['runs'])}</p>",
    "note": lambda b: f'<p{_SMALL}>{_runs(b["runs"])}</p>',
    "pairs": lambda b: _rows(b["rows"]),
    "table": _table,
    "equation": _equation,
    "verdict": _verdict,
    "figure": _figure,
    "notation": lambda b: _rows([[[{"math": row["latex"]}], row["meaning"], row["unit"]] for row in b["rows"]]),
    "references": lambda b: _rows(b["rows"]),
    "cautions": lambda b: _list("", b["rows"]),
    "identification": lambda b: _rows(b["rows"]),
}
