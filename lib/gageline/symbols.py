"""Every symbol once: meaning, display unit, LaTeX, plain text for figures. One symbol has one meaning in the whole package."""

from dataclasses import dataclass


@dataclass(frozen=True)
class Symbol:
    """A quantity's printed sign, its meaning and its display unit; ``places`` is the least number of decimals printed."""

    name: str
    latex: str
    unit: str
    meaning: str
    places: int = 0

    @property
    def spoken(self):
        """The sign as a screen reader says it: ``F_u`` reads "F u"."""
        return self.name.replace("_", " ")


def _table(text):
    table = {}
    for row in text.strip().splitlines():
        if not row.strip():
            continue
        name, latex, unit, meaning = (part.strip() for part in row.split("|"))
        if name in table:
            raise ValueError(f"symbol {name} stands twice in symbols.py")
        table[name] = Symbol(name, latex, unit, meaning, 2 if unit == "in" or name[0] == "U" or name in ("phi", "Omega") else 0)
    return table


SYMBOLS = _table(r"""
A_a    | A_a                 | in² | area of what hangs on the element and tears with it
A_b    | A_b                 | in² | nominal unthreaded body area of a bolt
A_c    | A_c                 | in² | gross area of the directly connected elements
A_e    | A_e                 | in² | effective net area
A_g    | A_g                 | in² | gross area of the part considered
A_gt   | A_{gt}              | in² | gross area subject to tension
A_gv   | A_{gv}              | in² | gross area subject to shear
A_gv0  | A_{gv,0}            | in² | gross shear area of the planes before
A_h    | A_h                 | in² | area lost to the holes of a chain
A_h0   | A_{h,0}             | in² | area lost to the holes before
A_n    | A_n                 | in² | net area
A_nt   | A_{nt}              | in² | net area subject to tension
A_nv   | A_{nv}              | in² | net area subject to shear
A_hv   | A_{hv}              | in² | area lost to holes along the shear planes
A_hv0  | A_{hv,0}            | in² | area lost to holes along the shear planes before
A_ht   | A_{ht}              | in² | area lost to holes across the tension plane
A_s    | A_s                 | in² | area credited for the diagonals of a chain
A_s0   | A_{s,0}             | in² | area credited for the diagonals before
c_1    | c_1                 | in  | width cut off at one edge
c_2    | c_2                 | in  | width cut off at the other edge
C_2    | C_2                 | in  | edge distance increment of Table J3.5
D_u    | D_u                 |     | ratio of mean installed to specified minimum pretension
d      | d                   | in  | full nominal depth of the section
d_b    | d_b                 | in  | nominal bolt diameter
d_h    | d_h                 | in  | nominal hole dimension in the direction considered
d_n    | d_n                 | in  | hole width deducted, damage allowance included
delta_h | \delta_h           | in  | allowance for damage round a hole
E      | E                   | ksi | modulus of elasticity of steel
e_max  | e_{max}             | in  | maximum edge distance
e_0    | e_0                 | in  | upper limit of the edge distance
F_cr   | F_{cr}              | ksi | critical stress
F_e    | F_e                 | ksi | elastic buckling stress
F_nv   | F_{nv}              | ksi | nominal shear stress of the bolt
F_nvr  | F_{nv,r}            | ksi | nominal shear stress of the bolt, reduced
F_u    | F_u                 | ksi | specified minimum tensile strength of the part considered
F_y    | F_y                 | ksi | specified minimum yield stress of the part considered
g      | g                   | in  | gage, transverse spacing between holes or gage lines
h_f    | h_f                 |     | factor for fillers in a slip-critical joint
K      | K                   |     | effective length factor
k_f    | k_f                 |     | factor for fillers on bolt shear
k_0    | k_0                 | 1/in | loss of bolt shear strength per thickness of filler
L_b    | L                   | in  | length considered for slenderness or buckling
L_e    | L_e                 | in  | distance from hole centre to edge, along the force
L_emin | L_{e,min}           | in  | minimum edge distance for a standard hole, Table J3.4
L_er   | L_{e,req}           | in  | edge distance required for the hole used
L_v    | L_v                 | in  | gross length of a shear plane
L_w    | L_w                 | in  | Whitmore width
l      | l                   | in  | length of the connection, first to last fastener
l_c    | l_c                 | in  | clear distance, edge of hole to edge of next hole or of the part
lam    | \lambda             |     | slenderness ratio
mu     | \mu                 |     | mean slip coefficient
n      | n                   |     | number of bolts of the joint
n_a    | n_a                 |     | number of bolts ahead of the chain, already unloaded
n_b    | n_b                 |     | number of like bolts
n_h    | n_h                 |     | number of holes, or half holes as 0.5
n_j    | n_j                 |     | number of like joints or pieces sharing the load
n_p    | n_p                 |     | number of slip planes
n_s    | n_s                 |     | number of shear planes in the bolt
n_z    | n_z                 |     | number of like diagonals in a chain
n_v    | n_v                 |     | number of like shear planes
Omega  | \Omega              |     | safety factor
phi    | \phi                |     | resistance factor
P_n    | P_n                 | kip | nominal axial strength
P_a    | \frac{P_n}{\Omega}          | kip | allowable axial strength
P_d    | \phi P_n            | kip | design axial strength
Q_n    | Q_n                 | kip | nominal strength of one joint or piece
R_n    | R_n                 | kip | nominal strength
R_n0   | R_{n,0}             | kip | nominal strength of the bolts before
R_a    | \frac{R_n}{\Omega}          | kip | allowable strength
R_d    | \phi R_n            | kip | design strength
R_nu   | R_{n,u}             | kip | block shear strength, shear rupture
R_ny   | R_{n,y}             | kip | block shear strength, shear yielding
r      | r                   | in  | radius of gyration
r_n    | r_n                 | kip | nominal strength of one bolt with its holes
r_nb   | r_{nb}              | kip | nominal bearing strength at one bolt hole
r_nt   | r_{nt}              | kip | nominal tearout strength at one bolt hole
r_nv   | r_{nv}              | kip | nominal shear strength of one bolt
s      | s                   | in  | pitch, spacing along the force
s_max  | s_{max}             | in  | maximum spacing along the member
s_min  | s_{min}             | in  | minimum spacing of hole centres
s_0    | s_0                 | in  | upper limit of the spacing
T_b    | T_b                 | kip | minimum bolt pretension
t      | t                   | in  | thickness of the part considered
t_fi   | t_{fi}              | in  | total thickness of fillers
t_f0   | t_{f,0}             | in  | thickness of fillers that needs no reduction
theta  | \theta_w            | rad | angle of spread of the Whitmore width
U      | U                   |     | shear lag factor
U_2    | U_{(2)}             |     | shear lag factor, case 2
U_7    | U_{(7)}             |     | shear lag factor, case 7
U_8    | U_{(8)}             |     | shear lag factor, case 8
U_A    | U_{A}               |     | shear lag factor, ratio of connected to gross area
U_bs   | U_{bs}              |     | block shear factor for the distribution of tension
w      | w                   | in  | width of the part considered
x_bar  | \bar{x}             | in  | eccentricity of the connection, connection plane to centroid
xi     | \xi                 |     | share of the load that is left at the chain
Z_x    | Z_x                 | in³ | plastic section modulus about the strong axis
Z_y    | Z_y                 | in³ | plastic section modulus about the weak axis
""")
