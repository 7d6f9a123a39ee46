"""Files that are written once: created whole or not at all, never over another one, also by two processes or after a kill."""

import contextlib
import datetime
import errno
import hashlib
import json
import os
import secrets
from pathlib import Path

from .errors import ReportError

PART = ".gageline-part"
"""Ending of a file that is being written; only ``create`` makes such files, and only inside ``locked``."""

_NO_LINKS = (errno.EPERM, errno.ENOTSUP, errno.ENOSYS, errno.EMLINK)


def canonical(data):
    """Return data as the one JSON text it is stored and hashed as, in bytes."""
    return (json.dumps(data, indent=1, ensure_ascii=False, sort_keys=True, allow_nan=False) + "\n").encode()


def sha256(data):
    """Return the SHA-256 of bytes, or of data as ``canonical`` writes it."""
    return hashlib.sha256(data if isinstance(data, bytes) else canonical(data)).hexdigest()


def now():
    """Return the time as a text in UTC, to the second."""
    return datetime.datetime.now(datetime.UTC).strftime("%Y-%m-%dT%H:%M:%SZ")


def reason(error):
    """Return what the operating system says about a failure, in small letters."""
    return (error.strerror or str(error)).lower()


def create(path, data):
    """Create a file that is either not there or complete, and synced to the disk before this returns.

    Parameters
    ----------
    path : the file; its folder must exist. data : bytes.

    Raises
    ------
    FileExistsError
        The file is there already; it is not touched.
    ReportError
        The folder cannot be written to, the disk is full, or its file system cannot make a file exclusively.
    """
    path = Path(path)
    part = path.with_name(f".{path.name}.{secrets.token_hex(6)}{PART}")
    try:
        handle = os.open(part, os.O_WRONLY | os.O_CREAT | os.O_EXCL, 0o644)
        try:
            view = memoryview(data)
            while view:
                view = view[os.write(handle, view):]
            os.fsync(handle)
        finally:
            os.close(handle)
        # Unlike a rename, a link never replaces what is there.
        os.link(part, path)
        sync_folder(path.parent)
    except FileExistsError:
        raise
    except OSError as error:
        if error.errno in _NO_LINKS:
            raise ReportError(f"{path.parent}: its file system cannot create a file exclusively (no hard links); "
                              "keep the project on one that can") from None
        raise ReportError(f"{path} cannot be written: {reason(error)}") from None
    finally:
        with contextlib.suppress(OSError):
            os.unlink(part)


def sync_folder(folder):
    """Sync a folder's entries to the disk, where the system can."""
    if os.name != "posix":
        return
    handle = os.open(folder, os.O_RDONLY)
    try:
        os.fsync(handle)
    finally:
        os.close(handle)


@contextlib.contextmanager
def locked(folder):
    """Hold a folder for this process; another one waits. The system frees it when the process ends, however it ends.

    Raises
    ------
    ReportError
        The folder cannot be written to.
    """
    try:
        Path(folder).mkdir(parents=True, exist_ok=True)
        handle = os.open(Path(folder) / ".gageline-lock", os.O_RDWR | os.O_CREAT, 0o644)
    except OSError as error:
        raise ReportError(f"{folder} cannot be written to: {reason(error)}") from None
    try:
        if os.name == "posix":
            import fcntl

            fcntl.flock(handle, fcntl.LOCK_EX)
        else:
            import msvcrt

            msvcrt.locking(handle, msvcrt.LK_LOCK, 1)
        yield
    finally:
        os.close(handle)


def sweep_parts(folder):
    """Remove files that a killed process left half-written; call it only inside ``locked``."""
    for path in Path(folder).glob(f".*{PART}"):
        with contextlib.suppress(OSError):
            path.unlink()


def read_json(path):
    """Return (bytes, data) of a JSON object in a file.

    Raises
    ------
    ReportError
        The file is missing or holds something else.
    """
    try:
        raw = Path(path).read_bytes()
        data = json.loads(raw)
    except OSError as error:
        raise ReportError(f"{path} cannot be read: {reason(error)}") from None
    except (json.JSONDecodeError, UnicodeDecodeError):
        raise ReportError(f"{path} is damaged: it is no JSON") from None
    if not isinstance(data, dict):
        raise ReportError(f"{path} is damaged: it holds no record")
    return raw, data
