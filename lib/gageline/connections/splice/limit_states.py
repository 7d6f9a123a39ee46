"""Limit states of a splice: the member's net section at the joint, and of each group its strength referred to the member's load."""

from ...check import Working, silent
from ...geometry import Part
from ...provisions import connecting, shear_lag, splices, tension
from .. import bolt_group, net_section, plate, tear_out
from ..outcome import Outcome, worked

K_PLATE = 0.65
"""Effective length factor of a splice plate between the rows beside the joint: a published design example of a flange plate."""


def member_yielding(splice):
    """Return yielding of the member's gross section."""
    return worked(lambda do: do(tension.gross_yielding, splice.F_y, splice.A_g))


def member_rupture(splice):
    """Return rupture of the member's net section at the first rows from its body."""
    if len(splice.groups) == 1:
        return net_section.net_rupture(splice.groups[0].joint)

    def compute(do):
        do.say("Flanges and web are spliced, Table D3.1 case 1. The first rows of all groups are taken in one section, which is safe.")
        A_h = None
        for group in splice.groups:
            ply, joint = group.joint.member, group.joint
            d_n = do(tension.hole_width, ply.hole.across, ply.constants.damage)
            number = joint.n_lines * ply.pieces
            A_h = do(tension.first_hole_loss, number, d_n, ply.t) if A_h is None else do(tension.hole_loss, A_h, number, d_n, ply.t)
        A_n = do(tension.net_area_straight, splice.A_g, A_h)
        return do(tension.net_rupture, splice.F_u, do(tension.effective_net_area, A_n, do(shear_lag.shear_lag_case_1)))

    return worked(compute)


def share(do, splice, group):
    """Work out the share of the member's load that a group carries."""
    shape = splice.section
    flanges = group.name == "flange"
    A_c = do(splices.flanges_area, shape.b_f, shape.t_f) if flanges else do(splices.rest_of_section, splice.A_g, shape.b_f, shape.t_f)
    return do(splices.share_by_area, A_c, splice.A_g)


def referred(name, evaluate, written_out=False):
    """Return a function of a Splice: a limit state of one group's joint, its strength referred to the member's load.

    Parameters
    ----------
    name : of the group. evaluate : function of a joint. written_out : whether the share is worked out in print.
    """

    def of(splice):
        group = splice.group(name)
        found = evaluate(group.joint)
        if group.alone:
            return found
        do = Working()
        whose = "two flange splices" if name == "flange" else "web splice"
        do.say(f"That is $Q_n$ of the {whose}; referred to the whole load of the member"
               + (":" if written_out else ", with the share as for bolts in shear:"))
        R_n = do(splices.referred_to_member, found.nominal, share(do if written_out else silent, splice, group))
        return Outcome(R_n, (*found.steps, *do.steps), found.path, found.notes)

    return of


def member_block(joint, alone):
    """Return block shear of the member; with both groups spliced, what hangs on the element carries its own share and is not counted."""
    if alone:
        return tear_out.block_shear(joint.member, tear_out.member_part(joint))
    part = joint.element
    return tear_out.block_shear(joint.member, Part(part.width, part.t, (), joint.member.end, part.name, part.edge_names))


def plate_compression(free_length):
    """Return a function of a joint: the plates in compression between the rows beside the joint.

    Parameters
    ----------
    free_length : (row to the end of the member, gap between the members). [in]
    """

    def of(joint):
        def compute(do):
            L = do(splices.free_length_at_joint, *free_length)
            ply = joint.plate
            A_g = do(connecting.like_plates_area, ply.pieces, ply.width, ply.t)
            return plate.column(do, ply, K_PLATE, L, A_g)

        return worked(compute)

    return of


def of_group(group, edition_clauses):
    """Return (id, title, clause, limit state, evaluate of a joint) of every limit state in tension of a group.

    Parameters
    ----------
    group : the group. edition_clauses : (bolt shear, bearing and tearout, slip).
    """
    shear, bearing, slip = edition_clauses
    joint, alone = group.joint, group.alone
    rows = [("bolt shear", "bolts in shear", shear, "bolts", bolt_group.shear_alone),
            ("bolts member", "bolts with member holes: shear, bearing, tearout", f"{shear}, {bearing}", "bolts",
             lambda j: bolt_group.at_holes(j, j.member)),
            ("bolts plate", "bolts with plate holes: shear, bearing, tearout", f"{shear}, {bearing}", "bolts",
             lambda j: bolt_group.at_holes(j, j.plate))]
    if joint.bolts.T_b:
        rows.append(("slip", "slip", slip, bolt_group.slip_factor(joint), bolt_group.slip))
    rows += [("member block", "block shear of the member", "J4.3", "block shear", lambda j: member_block(j, alone)),
             ("plate yielding", "yielding of the plates", "J4.1(a)", "yielding", plate.gross_yielding),
             ("plate rupture", "rupture of the plates", "J4.1(b)", "rupture", lambda j: net_section.plate_rupture(j.plate))]
    if len(joint.pattern) > 1:
        rows += [("Whitmore yielding", "yielding of the plates on the Whitmore width", "J4.1(a)", "yielding", plate.whitmore_yielding),
                 ("Whitmore rupture", "rupture of the plates on the Whitmore width", "J4.1(b)", "rupture", plate.whitmore_rupture)]
    return [*rows, ("plate block", "block shear of the plates", "J4.3", "block shear",
                    lambda j: tear_out.block_shear(j.plate, tear_out.plate_part(j)))]
