"""Works handed to several workers of this machine; one that dies, hangs or leaks costs its own mark and is replaced."""

import contextlib
from collections import deque
from multiprocessing.connection import wait

from .wires import Started
from .worker import Made

RECYCLED = 200
"""Marks after which a worker is replaced by a fresh one, so that no compiler's cache grows for ever."""


class _Member:
    """A started worker and the work it has."""

    def __init__(self, families, project_file):
        self.started, self.work, self.done = Started("worker"), None, 0
        self._send((families, project_file))

    def give(self, work):
        self.work = work
        self._send(work)

    def _send(self, said):
        with contextlib.suppress(OSError):  # it is dead already, which shows when its answer is awaited
            self.started.connection.send(said)


def each_made(works, workers):
    """Yield (work, made) as marks are finished, in any order; when the caller stops asking, all workers are ended.

    Parameters
    ----------
    works : ``Work`` of every mark. workers : how many run at once, at least 1.
    """
    waiting, members = deque(works), {}
    families = tuple(sorted({work.family for work in waiting}))

    def start():
        member = _Member(families, waiting[0].project_file)
        members[member.started.connection] = member
        member.give(waiting.popleft())

    try:
        for _ in range(min(workers, len(waiting))):
            start()
        while members:
            for connection in wait(list(members)):
                member = members[connection]
                work = member.work
                try:
                    made = connection.recv()
                    member.done += 1
                    lost = False
                except (EOFError, OSError):
                    made, lost = Made(fault="the process that worked on it died"), True
                if lost or not waiting or member.done >= RECYCLED:
                    del members[connection]
                    member.started.end()
                    if waiting:
                        start()
                else:
                    member.give(waiting.popleft())
                yield work, made
    finally:
        for member in members.values():
            member.started.end()
