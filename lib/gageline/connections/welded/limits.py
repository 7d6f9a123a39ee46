"""Limits of size, length and place of the fillet welds, and advice on them.  [AISC360] J2.2b, Table J2.4."""

from ... import units
from ...check import Working, not_applicable
from ...facts import welds as facts
from ...provisions import welds
from ..details import _limit as limit
from ..details import slenderness


def clause(edition, letter):
    """Return Section J2.2b with its letter, which is that of 360-22."""
    return f"J2.2b{letter}" if edition == "360-22" else "J2.2b"


def detailing(c):
    """Return every detailing check of the welds, then the advice."""
    end, given, edition = c.end, c.inputs, c.basis.edition
    thin = min(end.member.t, end.plate.t)
    out = [limit("fillet minimum", "Leg size, minimum (Table J2.4)", "weld", clause(edition, "(a)"), facts.minimum_fillet(thin), end.w_f, (),
                 notes=(f"Minimum size by the thinner part joined, {units.length(thin)}.",))]
    out.append(_largest(end, edition))
    do = Working()
    shortest = min(line.length for line in (*end.longitudinal, *end.transverse))
    l_min = do(welds.shortest_weld, end.w_f)
    out.append(limit("weld length", "Length of the shortest weld", "weld", clause(edition, "(c)"), l_min, shortest, do.steps))
    do = Working()
    l_lap = do(welds.least_lap, thin, facts.LEAST_LAP)
    out.append(limit("lap", "Lap of the parts", "weld", clause(edition, "(f)"), l_lap, end.lap, do.steps))
    out.append(limit("ledge", "Ledge beside the fillets", "weld", "geometry", end.w_f, min(end.ledges), ()))
    out += _advice(end, edition)
    return [*out, slenderness(c.element, given.member_length)]


def edge_thickness(end):
    """Return the thickness of the thinnest edge that a fillet runs along, None where there is none: heels are corners, not edges. [in]"""
    if end.on_plate:
        return end.plate.t
    if end.across == 2:
        return min(end.member.t, end.plate.t)
    channel = end.element.series in ("C", "MC")
    return end.member.t if end.across or not channel else None


def _largest(end, edition):
    id, title, where = "fillet maximum", "Leg size along an edge, maximum", clause(edition, "(b)")
    t, do = edge_thickness(end), Working()
    if t is None:
        return not_applicable(id, title, "weld", where, "the welds lie in the corners at the channel's heels, not along an edge", kind="detailing")
    thin = t < facts.EDGE_THICKNESS
    w_max = do(welds.largest_fillet_of_thin_edge, t) if thin else do(welds.largest_fillet, t, facts.EDGE_MARGIN)
    notes = ("The toe of a rolled angle is rounded: the largest leg size supposes that the fillet's legs can be seen and measured there.",) \
        if end.element.series in ("L", "2L") else ()
    return limit(id, title, "weld", where, w_max, end.w_f, do.steps, at_most=True, notes=notes)


def _advice(end, edition):
    long = "Length against distance of longitudinal welds"
    if end.across:
        why = "a weld across the end joins the longitudinal welds" if end.sided else "no longitudinal welds"
        yield not_applicable("length and distance", long, "weld", "Commentary D3", why, kind="advice")
    else:
        yield limit("length and distance", long, "weld", "Commentary D3", end.g, (end.l_1 + end.l_2) / 2, (), kind="advice",
                    notes=("Longitudinal welds not shorter than their distance: a rule of older editions that the commentary still calls reasonable; "
                           "shear lag is in U.",))
    title, where = "Welds short of the other part's edge", clause(edition, "(g), User Note")
    if not end.sided or (end.across and end.on_plate):
        yield not_applicable("hold back", title, "weld", where, "the weld lies along that edge", kind="advice")
    else:
        yield limit("hold back", title, "weld", where, end.w_f, end.lap - max(end.l_1, end.l_2), (), kind="advice",
                    notes=("A weld that runs to the edge of a part in tension can leave a notch there: an accepted practice is to stop it about "
                           "one leg size short.",))
