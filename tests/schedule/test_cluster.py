"""The same work on a real Dask cluster of this machine: the same files, and a fault that stays with its own row."""

import pytest

from gageline.errors import ReportError
from gageline.schedule import cluster, run

from .conftest import sample_rows, write_csv

distributed = pytest.importorskip("distributed")
HEADS, ROWS = sample_rows()


@pytest.mark.slow
def test_same_files_as_workers_of_our_own(project):
    chosen = [ROWS[0], ROWS[26]]
    path = write_csv(project / "ties.csv", HEADS, chosen)
    with distributed.LocalCluster(n_workers=1, threads_per_worker=1, processes=True, dashboard_address=None) as local:
        found = run.run(path, dask=local.scheduler_address)
    by_cluster = {mark: (found.places.pdf(mark).read_bytes(), found.places.book(mark).read_bytes()) for mark in sorted(found.made)}
    for mark in by_cluster:
        found.places.pdf(mark).unlink()
    again = run.run(path, workers=1)

    assert not found.all_faults and sorted(again.made) == sorted(by_cluster) == sorted(row["mark"] for row in chosen)
    assert {mark: (again.places.pdf(mark).read_bytes(), again.places.book(mark).read_bytes()) for mark in by_cluster} == by_cluster


def test_no_scheduler_there(monkeypatch):
    def refuse(*args, **kwargs):
        raise OSError("timed out")

    monkeypatch.setattr(distributed, "Client", refuse)

    with pytest.raises(ReportError, match="no Dask scheduler answers at tcp://nobody:1"):
        list(cluster.each_made([], "tcp://nobody:1"))


def test_another_version_on_the_cluster_is_told():
    from gageline.schedule.worker import Work, make_anywhere

    assert "another version" in make_anywhere(Work("X", "bolted", {}, "", "p/project.toml", program="of another one")).fault
