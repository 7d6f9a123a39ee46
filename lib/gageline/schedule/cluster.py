"""Works handed to a Dask cluster that runs already, for a firm with more machines; needs the optional extra ``dask``."""

from ..errors import ReportError
from .worker import Made, make_anywhere


def each_made(works, address):
    """Yield (work, made) as the cluster finishes marks, in any order.

    The works carry the project's files, so the machines need gageline installed and no common folder.

    Parameters
    ----------
    works : ``Work`` of every mark. address : of the cluster's scheduler, "tcp://host:8786".

    Raises
    ------
    ReportError
        dask.distributed is not installed, or no scheduler answers there.
    """
    try:
        from distributed import Client, as_completed
    except ImportError:
        raise ReportError("dask.distributed is missing: install gageline with its extra dask") from None
    try:
        client = Client(address, timeout="15s")
    except (OSError, ValueError, TimeoutError):
        raise ReportError(f"no Dask scheduler answers at {address}; give its address, for example tcp://host:8786") from None
    with client:
        futures = {client.submit(make_anywhere, work, pure=False, retries=0): work for work in works}
        try:
            for future in as_completed(list(futures)):
                work = futures.pop(future)
                error = future.exception()
                yield work, Made(fault=f"the cluster lost it: {type(error).__name__}") if error else future.result()
                future.release()
        finally:
            client.cancel(list(futures), force=True)
