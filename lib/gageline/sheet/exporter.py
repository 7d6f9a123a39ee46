"""The nbconvert exporter: `jupyter nbconvert --to gageline X.ipynb`, and an entry in JupyterLab's export menu."""

from nbconvert.exporters import Exporter
from traitlets import Unicode

from .build import build_pdf


class SheetExporter(Exporter):
    """Export an executed notebook as a calculation sheet (PDF); it never runs the notebook itself."""

    export_from_notebook = "Calculation sheet (PDF)"
    output_mimetype = "application/pdf"

    sheet_folder = Unicode("", help="Folder with a sheet.typ of the project's own; empty for the look that ships.").tag(
        config=True
    )

    def _file_extension_default(self):
        return ".pdf"

    def from_notebook_node(self, nb, resources=None, **kwargs):
        """Return the PDF's bytes and the resources nbconvert hands on.

        Raises
        ------
        ReportError : see ``build_pdf``.
        """
        resources = self._init_resources(resources)
        pdf = build_pdf(nb, sheet_folder=self.sheet_folder or None)
        resources["output_extension"] = self.file_extension
        return pdf, resources
