"""The files inside a PDF, read without running anything of it."""

import io
import zipfile
import zlib
from pathlib import Path

from .. import store
from ..errors import ReportError

_LARGEST = 64_000_000


def read_attachments(path):
    """Return name -> bytes of the files attached to a PDF; of a record-profile PDF those of the bundle (.zip) beside it.

    Raises
    ------
    ReportError
        The file is missing or no readable PDF, or there is nothing attached and no bundle.
    """
    import pikepdf

    path = Path(path)
    try:
        with pikepdf.open(path) as pdf:
            found = {name: spec.get_file().read_bytes() for name, spec in pdf.attachments.items()}
    except OSError as error:
        raise ReportError(f"{path} cannot be read: {store.reason(error)}") from None
    except Exception as error:
        # pikepdf and the libraries under it raise many kinds on a damaged file.
        raise ReportError(f"{path} is no readable PDF: {str(error).splitlines()[0] if str(error) else type(error).__name__}") from None
    return found or read_bundle(path.with_suffix(".zip"), path)


def read_bundle(path, pdf):
    """Return name -> bytes of a record profile's bundle."""
    try:
        with zipfile.ZipFile(path) as bundle:
            if sum(entry.file_size for entry in bundle.infolist()) > _LARGEST:
                raise ValueError(f"it unpacks to more than {_LARGEST // 1_000_000} MB")
            return {entry.filename: bundle.read(entry) for entry in bundle.infolist()}
    except FileNotFoundError:
        raise ReportError(f"{pdf} carries no files and there is no bundle {path.name} beside it") from None
    except (OSError, zipfile.BadZipFile, zlib.error, EOFError, NotImplementedError, RuntimeError, ValueError) as error:
        # What zipfile raises on damaged data depends on where the damage is.
        raise ReportError(f"{path} cannot be read: {error}") from None


def bundle(files):
    """Return the bytes of a bundle of name -> bytes; the same files give the same bytes."""
    out = io.BytesIO()
    with zipfile.ZipFile(out, "w", zipfile.ZIP_DEFLATED) as made:
        for name in sorted(files):
            made.writestr(zipfile.ZipInfo(name, (1980, 1, 1, 0, 0, 0)), files[name], zipfile.ZIP_DEFLATED, 9)
    return out.getvalue()
