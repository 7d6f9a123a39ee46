"""From inputs to the hanger that is computed: fitting, beam, bolts, hung member, and both joints."""

from math import tan

from ...errors import InputError
from ...facts import bolts as facts
from ...facts import grades, shapes, welds
from ...geometry import End, Hole, centred_edge, grid, mirrored
from ..element import element
from ..joint import Bolts, Joint, Ply, constants
from .design import Beam, Fitting, Hanger, Hung, Welds

FAR = 1e3
"""Edge of the stem where it does not matter yet. [in]"""


def fitting(given, edition):
    """Return the Fitting that the inputs describe."""
    shape = shapes.shape(given.fitting)
    if shape.series in ("WT", "MT", "ST"):
        if given.gap is not None or given.bolted_leg is not None:
            raise InputError(f"gap and bolted_leg are for double angles; {shape.name} is a tee")
        steel = grades.material(given.fitting_grade, form="shape", series=shape.series, edition=edition)
        return Fitting(shape.name, True, shape, shape.t_f, shape.t_w, 1, 0.0, shape.b_f, shape.d, shape.k_des, steel.F_y, steel.F_u)
    if shape.series != "2L":
        raise InputError(f"fitting {shape.name}: a hanger's fitting is a tee (WT, MT, ST) or a double angle (2L)")
    steel = grades.material(given.fitting_grade, form="shape", series="L", edition=edition)
    single, leg = shape.single, given.bolted_leg
    if leg is None and single.b_long != single.b_short:
        raise InputError(f"bolted_leg is missing: {shape.name} has unequal legs; give long leg or short leg")
    if leg not in (None, "long leg", "short leg"):
        raise InputError(f"bolted_leg = {leg!r} is not allowed; allowed: long leg, short leg")
    on_beam, down = (single.b_short, single.b_long) if leg == "short leg" else (single.b_long, single.b_short)
    plate = element(given.member, given.connected_by)
    gap = plate.t if given.gap is None else given.gap
    return Fitting(shape.name, False, single, single.t, single.t, 2, gap, 2 * on_beam + gap, down, single.k_des, steel.F_y, steel.F_u)


def beam(given, edition):
    """Return the Beam that the inputs describe."""
    shape = shapes.shape(given.beam)
    if shape.series not in ("W", "M", "S", "HP"):
        raise InputError(f"beam {shape.name}: a hanger hangs below a W, M, S or HP shape")
    steel = grades.material(given.beam_grade, form="shape", series=shape.series, edition=edition)
    return Beam(shape, steel.F_y, steel.F_u, given.beam_end)


def hung(given, fit, edition):
    """Return (Hung, its Material): the hung member."""
    part = element(given.member, given.connected_by, fit.t_s)
    if part.series == "PL":
        form = "bar" if given.member.strip().lower().startswith("bar") else "plate"
        steel = grades.material(given.member_grade, form=form, thickness=part.t, edition=edition)
    else:
        steel = grades.material(given.member_grade, form="shape", series="L", edition=edition)
    return Hung(part, steel.F_y, steel.F_u, given.U_by_hand, given.U_basis), steel


def hole(size, kind):
    """Return (across, along) of a hole as written in the inputs. [in]"""
    name, _, direction = kind.partition(" ")
    made = facts.hole(size, name)
    return (made.length, made.width) if direction == "across" else (made.width, made.length)


class _One:
    """What the bolts to the beam need to know of an element: there is one group of them."""

    joints = 1


def upper(given, basis, fit, support, size, group, rows, s):
    """Return the bolts to the beam as a joint in shear along the beam."""
    centres = grid(2, rows, s if rows > 1 else 0.0, (given.gage,), 0.0, 0.0)
    last = (rows - 1) * s
    plies = []
    for name, kind, part, t, width in (("member", given.fitting_holes, fit, fit.t_f, fit.width),
                                       ("plate", given.beam_holes, support, support.section.t_f, support.section.b_f)):
        edge = centred_edge(width, 2, [given.gage])
        holes = [Hole(x, y + edge, *hole(size, kind), t) for x, y in centres]
        end = End(last + given.fitting_end) if name == "member" else End(given.beam_end - last / 2)
        plies.append(Ply(name, part.F_y, part.F_u, t, 1, 1, tuple(holes if name == "member" else mirrored(holes)), end, width, kind,
                         constants(basis)))
    slip_critical = given.installation == "slip-critical"
    bolts = Bolts(size.name, group.name, size.d, group.F_nv_X if given.threads == "X" else group.F_nv_N, given.threads, 1,
                  facts.pretension(size, group) if slip_critical else 0.0, given.installation, {"A": 0.30, "B": 0.50}.get(given.slip_class, 0.0))
    return Joint(_One, plies[0], plies[1], bolts, None, 0.0, 0, given.deformation_considered)


def lower(given, basis, fit, member, size, group, edges):
    """Return the bolts between the hung member and the stem as a joint; the stem is its plate, cut off at ``edges`` beside the pull. [in]"""
    part = member.element
    gages = (given.lower_gage,) * (given.lower_lines - 1)
    start = centred_edge(part.width, given.lower_lines, list(gages)) if part.back is None else given.lower_gage_from_back
    centres = grid(given.lower_lines, given.lower_rows, given.lower_pitch or 0.0, gages, 0.0, start)
    ys = [y for _, y in centres]
    axis, low, high = (min(ys) + max(ys)) / 2, *edges
    sizes = hole(size, given.lower_holes)
    last = max(x for x, _ in centres)
    ply = Ply("member", member.F_y, member.F_u, part.t, part.plies, part.pieces, tuple(Hole(x, y, *sizes, part.t) for x, y in centres),
              End(last + given.member_end), part.width, given.lower_holes, constants(basis))
    shifted = [Hole(x, y - axis + low, *sizes, fit.t_s) for x, y in centres]
    slope = tan(given.inclination)
    stem = Ply("plate", fit.F_y, fit.F_u, fit.t_s, fit.plies, fit.plies, tuple(mirrored(shifted)),
               End(given.stem_end - slope * low, slope), low + high, given.lower_holes, constants(basis))
    bolts = Bolts(size.name, group.name, size.d, group.F_nv_X if given.lower_threads == "X" else group.F_nv_N, given.lower_threads,
                  part.plies + fit.plies - 1, 0.0, "pretensioned" if given.installation != "snug" else "snug", 0.0)
    return Joint(part, ply, stem, bolts, None, 0.0, 0, given.deformation_considered, given.U_by_hand, given.U_basis)


def made(given, basis, fit, support, member, sizes, group, P, rows=None, s=None):
    """Return the Hanger; ``rows`` and ``s`` (which may be an array) replace the inputs' in a sweep."""
    rows = given.rows if rows is None else rows
    s = (given.pitch or 0.0) if s is None else s
    by_hand = {"fitting": given.p_by_hand and (given.p_by_hand, given.p_basis),
               "beam": given.p_beam_by_hand and (given.p_beam_by_hand, given.p_beam_basis)}
    seams = None
    if given.joined == "welded":
        part = member.element
        seams = Welds(given.weld, given.weld_length, welds.electrode(given.electrode).F_EXX, part.width, part.pieces)
    above = upper(given, basis, fit, support, sizes[0], group, rows, s)
    common = (fit, support, member, above, group.F_nt, rows, s, given.fitting_end, given.gage, given.inclination, P, basis.method, basis.edition)
    if seams:
        return Hanger(*common, seams, None, given.stem_end, by_hand)
    # A first joint with edges that do not matter yet gives the spread of the bolts, from which the stem's edges follow.
    first = Hanger(*common, None, lower(given, basis, fit, member, sizes[1], group, (FAR, FAR)), given.stem_end, by_hand)
    return Hanger(*common, None, lower(given, basis, fit, member, sizes[1], group, first.edges), given.stem_end, by_hand)
