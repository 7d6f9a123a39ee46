"""Issuing under faults: killed at every system call and at random instants, a full disk, two issuers at once, folders that refuse.

After each fault the same is asked: no issued file has changed, an issue is there wholly or not at all, and the next issue cleans up.
"""

import contextlib
import errno
import os
import random
import resource
import shutil
import signal
import tempfile
import time
from pathlib import Path

import pytest

from gageline import store
from gageline.archive import records, stamping
from gageline.archive.commit import commit, mark_later, void
from gageline.errors import GagelineError, InputError, ReportError

from .conftest import record, small_pdf, snapshot

CALLS = ("open", "write", "fsync", "link", "unlink", "close")
PDF = {rev: small_pdf(f"revision {rev}") for rev in ("0", "1", "2")}


def issue(folder, rev="0", mark="H1", pdf=None, built_on=()):
    return commit(folder, records.stem(mark, rev), {f"{mark}-rev{rev}.pdf": pdf or PDF[rev]}, record(mark, rev), built_on)


@pytest.fixture(autouse=True)
def light_stamps(monkeypatch):
    """Stamp without Typst: its threads do not live on in a forked child. Stamping itself is tested with issuing."""
    monkeypatch.setattr(stamping, "stamped", lambda path, kind, reason: small_pdf(f"{kind} {reason}"))


@pytest.fixture
def folder(tmp_path):
    """Return a reports folder with revision 0 of H1 issued."""
    issue(tmp_path / "reports")
    return tmp_path / "reports"


def mark_void(folder):
    """Void revision 0 without the trial print of the reason, which needs Typst."""
    with store.locked(folder):
        mark_later(folder, records.read_record(folder / "H1-rev0.json")[1], "void", "wrong hanger", "C.D.")


def in_child(work):
    """Run a function in a child process and return how it ended: its exit code, or minus the signal."""
    child = os.fork()
    if not child:
        code = 0
        signal.alarm(10)
        try:
            work()
        except GagelineError:
            code = 3
        except BaseException:
            code = 4
        os._exit(code)
    return os.waitstatus_to_exitcode(os.waitpid(child, 0)[1])


def at_call(number, act):
    """Make the number-th system call of ours in this process call ``act`` first."""
    count = 0

    def counted(call):
        def wrapped(*args, **kwargs):
            nonlocal count
            count += 1
            if count == number:
                act()
            return call(*args, **kwargs)

        return wrapped

    for name in CALLS:
        setattr(os, name, counted(getattr(os, name)))


def settled(folder, before, name="H1-rev1"):
    """Assert that nothing issued has changed and that the new issue is there wholly or not at all; return whether it is."""
    now = snapshot(folder)
    assert {each: now.get(each) for each in before} == before
    ledger = records.read(folder)
    if f"{name}.json" in now:
        assert now[f"{name}.pdf"] == store.sha256(PDF["1"])
        assert not ledger.faults
        return True
    assert all("not finished" in fault for fault in ledger.faults)
    return False


def after(folder, before):
    """Issue what a fault may have prevented, and assert that the folder is as if no fault had been."""
    if not settled(folder, before):
        issue(folder, "1", built_on=["0"])
    else:
        with pytest.raises(InputError, match="never overwritten"):
            issue(folder, "1", built_on=["0"])
        issue(folder, "2", built_on=["0", "1"])
    ledger = records.read(folder)
    assert ledger.faults == [] and set(snapshot(folder)) >= {f"H1-rev0.superseded.{kind}" for kind in ("pdf", "json")}
    assert [path.name for path in folder.iterdir() if path.name.startswith(".")] == [".gageline-lock"]


class TestKilled:
    def test_at_every_system_call(self, folder, tmp_path):
        """Killed before each open, write, sync, link, unlink and close in turn, until an issue comes through."""
        killed, committed = 0, 0
        for number in range(1, 400):
            here = tmp_path / "try"
            shutil.rmtree(here, ignore_errors=True)
            shutil.copytree(folder, here)
            before = snapshot(here)

            def work(here=here, number=number):
                at_call(number, lambda: os._exit(9))
                issue(here, "1", built_on=["0"])

            code = in_child(work)
            if code == 0:
                break
            assert code == 9
            killed += 1
            committed += settled(here, before)
            after(here, before)
        assert killed > 40 and 0 < committed < killed
        print(f"killed at {killed} system calls; the issue stood after {committed} of them")

    def test_at_random_instants(self, folder, tmp_path):
        """SIGKILL from outside after a random time, 80 times."""
        rng, stood, ended = random.Random(4), 0, 0
        for _ in range(80):
            here = tmp_path / "try"
            shutil.rmtree(here, ignore_errors=True)
            shutil.copytree(folder, here)
            before = snapshot(here)
            child = os.fork()
            if not child:
                with contextlib.suppress(BaseException):
                    issue(here, "1", built_on=["0"])
                os._exit(0)
            time.sleep(rng.uniform(0, 0.05))
            os.kill(child, signal.SIGKILL)
            ended += os.waitstatus_to_exitcode(os.waitpid(child, 0)[1]) == 0
            stood += settled(here, before)
            after(here, before)
        assert stood > 0 and ended < 80
        print(f"80 kills: {stood} issues stood, {ended} had ended before the signal")

    def test_killed_while_voiding(self, folder, tmp_path):
        """The issue stays as it was, and voiding again finishes."""
        for number in range(1, 200):
            here = tmp_path / "try"
            shutil.rmtree(here, ignore_errors=True)
            shutil.copytree(folder, here)
            before = snapshot(here)

            def work(here=here, number=number):
                at_call(number, lambda: os._exit(9))
                mark_void(here)

            code = in_child(work)
            assert {name: snapshot(here).get(name) for name in before} == before
            if not (here / "H1-rev0.void.json").exists():
                mark_void(here)
            ledger = records.read(here)
            assert not ledger.faults and ledger.status(ledger.issues["H1", "0"]) == "void"
            if code == 0:
                break
        assert number > 10


class TestDisk:
    @pytest.mark.parametrize("number", range(1, 34))
    def test_full_at_any_call(self, folder, number):
        """No space left at the n-th call: a sentence, or the issue; never a part of one."""
        before = snapshot(folder)

        def work():
            def full():
                raise OSError(errno.ENOSPC, "No space left on device")

            at_call(number, full)
            issue(folder, "1", built_on=["0"])

        assert in_child(work) in (0, 3)
        after(folder, before)

    @pytest.mark.parametrize("limit", [1, 100, 400, 700])
    def test_full_for_real(self, folder, limit):
        """The system itself refuses to write more than so many bytes to a file."""
        before = snapshot(folder)

        def work():
            signal.signal(signal.SIGXFSZ, signal.SIG_IGN)
            resource.setrlimit(resource.RLIMIT_FSIZE, (limit, limit))
            issue(folder, "1", built_on=["0"], pdf=PDF["1"])

        assert in_child(work) == 3
        assert not settled(folder, before)
        after(folder, before)

    def test_read_only_folder(self):
        """Nobody's process in a folder that only its owner may write: one sentence, nothing changed."""
        home = Path(tempfile.mkdtemp())
        try:
            home.chmod(0o755)
            issue(home / "reports")
            (home / "reports").chmod(0o555)
            before = snapshot(home / "reports")
            said = home / "said"
            said.write_text("")
            said.chmod(0o666)

            def work():
                if os.geteuid() == 0:
                    os.setuid(65534)
                try:
                    issue(home / "reports", "1", built_on=["0"])
                except ReportError as error:
                    said.write_text(str(error))
                    raise

            assert in_child(work) == 3
            assert "cannot be written to: permission denied" in said.read_text()
            assert snapshot(home / "reports") == before
        finally:
            (home / "reports").chmod(0o755)
            shutil.rmtree(home)

    def test_no_hard_links(self, folder, monkeypatch):
        """A file system without them is named, and nothing is issued by a weaker means."""
        def refuse(*args, **kwargs):
            raise OSError(errno.EPERM, "Operation not permitted")

        before = snapshot(folder)
        monkeypatch.setattr(os, "link", refuse)
        with pytest.raises(ReportError, match="hard links"):
            issue(folder, "1", built_on=["0"])
        assert snapshot(folder) == before


class TestRaces:
    def test_twenty_issuers_of_one_revision(self, tmp_path):
        """One wins; the others are refused; its bytes are the ones recorded."""
        folder = tmp_path / "reports"
        pdfs = [small_pdf(f"issuer {i}") for i in range(20)]
        start, children = time.monotonic() + 0.3, []
        for pdf in pdfs:
            child = os.fork()
            if not child:
                code = 4
                with contextlib.suppress(BaseException):
                    time.sleep(max(0.0, start - time.monotonic()))
                    try:
                        issue(folder, "0", pdf=pdf)
                        code = 0
                    except InputError:
                        code = 3
                os._exit(code)
            children.append(child)
        codes = [os.waitstatus_to_exitcode(os.waitpid(child, 0)[1]) for child in children]
        assert sorted(codes) == [0] + [3] * 19
        assert (folder / "H1-rev0.pdf").read_bytes() == pdfs[codes.index(0)]
        assert records.read(folder).faults == []

    def test_without_the_lock_nothing_is_overwritten_either(self, folder, monkeypatch):
        """Where a network disk's lock does nothing, the exclusive link still refuses the second."""
        monkeypatch.setattr(records, "read", lambda *args, **kwargs: records.Ledger(folder))
        before = snapshot(folder)
        monkeypatch.setattr(Path, "exists", lambda self: False)
        with pytest.raises(InputError, match="nothing is overwritten"):
            issue(folder, "0", pdf=PDF["1"])
        assert snapshot(folder) == before

    def test_many_marks_at_once(self, tmp_path):
        """Sixteen marks issued at the same moment: sixteen numbers, one chain."""
        folder = tmp_path / "reports"
        children = []
        for i in range(16):
            child = os.fork()
            if not child:
                code = 4
                with contextlib.suppress(BaseException):
                    issue(folder, "0", mark=f"M{i}")
                    code = 0
                os._exit(code)
            children.append(child)
        assert [os.waitstatus_to_exitcode(os.waitpid(child, 0)[1]) for child in children] == [0] * 16
        ledger = records.read(folder)
        assert not ledger.faults and sorted(each["sequence"] for each in ledger.issues.values()) == list(range(1, 17))

    def test_another_revision_meanwhile(self, folder):
        """What was compared with revision 0 is not issued over a revision 1 that came between."""
        issue(folder, "1", built_on=["0"])
        with pytest.raises(InputError, match="at this moment by another process"):
            issue(folder, "2", built_on=["0"])


class TestTampering:
    """Whatever is changed after issuing is reported by the register and stops nobody else's issue."""

    def faults(self, folder):
        return " ".join(records.read(folder).faults)

    def test_any_flipped_bit_of_the_pdf(self, folder):
        """Each of 200 bits spread over the file."""
        path = folder / "H1-rev0.pdf"
        good = path.read_bytes()
        for i in range(200):
            bad = bytearray(good)
            bad[i * len(good) // 200] ^= 1 << i % 8
            path.write_bytes(bad)
            assert "H1-rev0.pdf is not what was issued" in self.faults(folder)
        path.write_bytes(good)
        assert self.faults(folder) == ""

    @pytest.mark.parametrize(("old", "new"), [("preliminary", "for construction"), ("2026-12-01", "2026-11-01"),
                                              ('"A.B."', '"X.Y."'), ("0.5", "0.4")])
    def test_an_edited_record(self, folder, old, new):
        """It no longer gives its own hash."""
        path = folder / "H1-rev0.json"
        assert old in path.read_text()
        path.write_text(path.read_text().replace(old, new))
        assert "was edited" in self.faults(folder)

    def test_a_record_edited_with_its_hash(self, folder):
        """The record issued next remembers the hash of the one before."""
        issue(folder, "0", mark="K1")
        _, data = records.read_record(folder / "H1-rev0.json")
        data.pop("record_sha256")
        (folder / "H1-rev0.json").write_bytes(records.sealed(data | {"status": "for construction"}))
        assert "record of H1-rev0 was edited or exchanged" in self.faults(folder)

    @pytest.mark.parametrize(("names", "said"), [(["H1-rev0.pdf"], "cannot be read"), (["H1-rev0.json"], "has no record"),
                                                 (["H1-rev0.json", "H1-rev0.pdf"], "no. 1")])
    def test_removed_files(self, folder, names, said):
        """PDF, record, or both of an issue that others followed."""
        issue(folder, "0", mark="K1")
        for name in names:
            (folder / name).unlink()
        assert said in self.faults(folder)

    def test_a_pdf_without_its_record_is_never_taken_for_a_leftover(self, folder):
        """Only an intent makes a leftover: a lost record does not cost the PDF too."""
        (folder / "H1-rev0.json").unlink()
        with pytest.raises(InputError, match="never overwritten"):
            issue(folder, "0", pdf=PDF["1"])
        assert (folder / "H1-rev0.pdf").read_bytes() == PDF["0"]

    def test_an_intent_removes_only_what_it_names(self, folder):
        """A file of that name with other bytes stays."""
        (folder / "H1-rev1.pdf").write_bytes(b"somebody's own")
        (folder / ".H1-rev1.issuing").write_bytes(store.canonical({"H1-rev1.pdf": store.sha256(PDF["1"]), "../x": "y"}))
        with pytest.raises(InputError, match="never overwritten"):
            issue(folder, "1", built_on=["0"])
        assert (folder / "H1-rev1.pdf").read_bytes() == b"somebody's own"

    @pytest.mark.parametrize("text", ["", "[]", "nonsense", '{"gageline_record": 1}', "\udcff"])
    def test_a_damaged_record_does_not_stop_other_marks(self, folder, text):
        """It is named; another mark is issued all the same."""
        (folder / "H1-rev0.json").write_bytes(text.encode("utf-8", "surrogateescape"))
        issue(folder, "0", mark="K1")
        assert "H1-rev0.json" in self.faults(folder)

    def test_exchanged_records(self, folder):
        """A record under another's name."""
        issue(folder, "0", mark="K1")
        shutil.copyfile(folder / "K1-rev0.json", folder / "H1-rev0.json")
        assert "not the record that its name says" in self.faults(folder)


class TestClock:
    def test_backwards(self, folder, monkeypatch):
        """Order is by number: a later issue with an earlier time supersedes, and the register says that the clock went back."""
        monkeypatch.setattr(store, "now", lambda: "2001-01-01T00:00:00Z")
        issue(folder, "1", built_on=["0"])
        ledger = records.read(folder)
        assert ledger.status(ledger.issues["H1", "0"]) == "superseded" and ledger.status(ledger.issues["H1", "1"]) == "preliminary"
        assert len(ledger.faults) == 1 and "clock went back before H1-rev1" in ledger.faults[0]
        issue(folder, "2", built_on=["0", "1"])


class TestRevisions:
    def test_order(self):
        """Letters before numbers, AA after Z, 10 after 9, 1A between 1 and 2."""
        revs = ["A", "B", "Z", "AA", "0", "1", "1A", "2", "9", "10"]
        assert sorted(random.Random(1).sample(revs, len(revs)), key=records.order) == revs

    @pytest.mark.parametrize("rev", ["", "a", "01", "1a", "-1", "1/2", "../0", "0\n", "AAA", "١", "1.0"])
    def test_refused(self, rev):
        """What is no revision, above all what would leave the folder."""
        with pytest.raises(InputError):
            records.order(rev)

    def test_void_is_by_a_further_record(self, folder):
        """The issue stays byte for byte; once only."""
        before = snapshot(folder)
        void(folder / "H1-rev0.pdf", "C.D.", "wrong hanger")
        assert {name: snapshot(folder)[name] for name in before} == before
        with pytest.raises(InputError, match="void already"):
            void(folder / "H1-rev0.pdf", "C.D.", "again")
        record = issue(folder, "1", built_on=["0"])
        assert record["supersedes"] == []
