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
a_45   | a_{45}              | in  | edge of the pin hole to the cut corner, square to the cut
A_a    | A_a                 | in² | area of what hangs on the element and tears with it
A_b    | A_b                 | in² | nominal unthreaded body area of a bolt
A_c    | A_c                 | in² | gross area of the directly connected elements
A_D    | A_D                 | in² | area on the major diameter of the thread
A_e    | A_e                 | in² | effective net area
A_g    | A_g                 | in² | gross area of the part considered
A_gt   | A_{gt}              | in² | gross area subject to tension
A_gv   | A_{gv}              | in² | gross area subject to shear
A_gv0  | A_{gv,0}            | in² | gross shear area of the planes before
A_h    | A_h                 | in² | area lost to the holes of a chain
A_h0   | A_{h,0}             | in² | area lost to the holes before
A_n    | A_n                 | in² | net area
A_nt   | A_{nt}              | in² | net area subject to tension
A_ns   | A_{ns}              | in² | net area of the tube alone
A_nv   | A_{nv}              | in² | net area subject to shear
A_hv   | A_{hv}              | in² | area lost to holes along the shear planes
A_hv0  | A_{hv,0}            | in² | area lost to holes along the shear planes before
A_ht   | A_{ht}              | in² | area lost to holes across the tension plane
A_p    | A_p                 | in² | area of the pin
a_p    | a_p                 | in  | edge of the pin hole to the end of the plate, along the force
A_pb   | A_{pb}              | in² | projected or contact area in bearing
A_r    | A_r                 | in² | area of the reinforcing plates
A_re   | A_{re}              | in² | effective area of the reinforcing plates
a_req  | a_{req}             | in  | least edge distance of the pin hole, along the force
A_s    | A_s                 | in² | area credited for the diagonals of a chain
A_s0   | A_{s,0}             | in² | area credited for the diagonals before
A_sf   | A_{sf}              | in² | area on the shear failure path beyond the pin
A_ts   | A_t                 | in² | tensile stress area of the thread
A_we   | A_{we}              | in² | effective area of the welds
A_we0  | A_{we,0}            | in² | effective area of the weld lines before
alpha_c | \bar{\alpha}_g     | in  | column face to the centroid of the beam edge as built
alpha_g | \alpha_g            | in  | column face to the centroid of the beam edge, without moment on it
b_0    | b_0                 | in  | constant of the effective width of a pin plate
b_e    | b_e                 | in  | effective width of a pin plate beside the hole
b_f    | b_f                 | in  | width of the flange
b_max  | b_{max}             | in  | greatest width beside the eyebar's hole that counts
b_min  | b_{min}             | in  | width beside the eyebar's hole that must be exceeded
b_p    | b_p                 | in  | edge of the pin hole to the side of the plate, across the force
beta_c | \bar{\beta}_g       | in  | beam face to the centroid of the column edge as built
beta_g | \beta_g             | in  | beam face to the centroid of the column edge, without moment on it
beta_w | \beta_w             |     | factor on the length of an end-loaded weld
B      | B                   | in  | overall width of the tube, across the plane of the gusset
b_w    | b_w                 | in  | outside of the tube's wall to the gusset's face or middle plane
c_1    | c_1                 | in  | width cut off at one edge
c_2    | c_2                 | in  | width cut off at the other edge
C_2    | C_2                 | in  | edge distance increment of Table J3.5
c_k    | c_k                 |     | factor for the length of the load in web crippling
c_g    | c_g                 | in  | corner of the brace's connection to the adjacent supported edge
c_p    | c_p                 | in  | leg of the corner cut at 45 degrees
C_r    | C_r                 |     | reduction factor for the clearance of the pin hole
c_s    | c_s                 | in  | clearance of the slot over the gusset, total
c_w    | c_w                 | in  | overhang of the plate washer beyond the nut
D      | D                   | in  | outside diameter of the tube
d_hmax | d_{h,max}           | in  | greatest diameter of the pin hole
d_p    | d_p                 | in  | diameter of the pin
d_pmin | d_{p,min}           | in  | least diameter of the eyebar's pin
d_r    | d_r                 | in  | nominal diameter of the rod's thread
D_u    | D_u                 |     | ratio of mean installed to specified minimum pretension
d      | d                   | in  | full nominal depth of the section
d_b    | d_b                 | in  | nominal bolt diameter
d_h    | d_h                 | in  | nominal hole dimension in the direction considered
d_n    | d_n                 | in  | hole width deducted, damage allowance included
d_y    | d_y                 | in  | diameter of the rod's body
delta_h | \delta_h           | in  | allowance for damage round a hole
delta_f | \delta_f           | in  | margin of a fillet weld below the edge of the part
delta_g | \delta_g           | in  | gap between tube and gusset at the weld
delta_p | \delta_p            | in  | greatest clearance of the pin in its hole
Delta_r | \Delta              | in  | elongation of the rod at service load
E      | E                   | ksi | modulus of elasticity of steel
e_b    | e_b                 | in  | half depth of the beam
e_c    | e_c                 | in  | half depth of the column, 0 at its web
e_m    | e_m                 | in  | last row of bolts to the end of the member
e_max  | e_{max}             | in  | maximum edge distance
e_0    | e_0                 | in  | upper limit of the edge distance
e_p    | e_p                 | in  | arm of half the load about the middle of the pin
e_w    | e_w                 | in  | centroid of the edge to the point where the axis of the brace meets it
f_a    | f_a                 | kip/in | force per length normal to the edge, from the normal force
f_avg  | f_{avg}             | kip/in | average force per length of the edge
f_b    | f_b                 | kip/in | force per length normal to the edge, from the moment
F_cr   | F_{cr}              | ksi | critical stress
F_e    | F_e                 | ksi | elastic buckling stress
F_EXX  | F_{EXX}             | ksi | filler metal strength
f_l    | f_{min}             | kip/in | force per length at the other end of the edge
F_nv   | F_{nv}              | ksi | nominal shear stress of the bolt
F_nvr  | F_{nv,r}            | ksi | nominal shear stress of the bolt, reduced
f_p    | f_{max}             | kip/in | greatest force per length of the edge
F_u    | F_u                 | ksi | specified minimum tensile strength of the part considered
f_v    | f_v                 | kip/in | force per length along the edge
f_w    | f_w                 | kip/in | force per length that the weld of the edge is made for
F_w    | F_w                 | kip | force on the gusset's edge that is compared with its strength
F_y    | F_y                 | ksi | specified minimum yield stress of the part considered
g      | g                   | in  | gage, transverse spacing between holes or gage lines
g_w    | g_w                 | in  | distance between the longitudinal welds
g_j    | g_j                 | in  | gap between the ends of the members
g_p    | g_p                 | in  | gap between an outer and the inner ply on the pin
H      | H                   | in  | overall height of the tube, in the plane of the gusset
H_b    | H_b                 | kip | horizontal force on the beam edge, along it
H_c    | H_c                 | kip | horizontal force on the column edge, normal to it
h_f    | h_f                 |     | factor for fillers in a slip-critical joint
I_e    | I_e                 |     | sum of the interaction at the gusset's edge
K      | K                   |     | effective length factor
k_ds   | k_{ds}              |     | directional strength increase factor
k_f    | k_f                 |     | factor for fillers on bolt shear
k_0    | k_0                 | 1/in | loss of bolt shear strength per thickness of filler
L_1    | L_1                 | in  | Whitmore width to the support, on the axis of the brace
L_2    | L_2                 | in  | one end of the Whitmore width to the support, along the brace
L_3    | L_3                 | in  | other end of the Whitmore width to the support, along the brace
L_b    | L                   | in  | length considered for slenderness or buckling
L_e    | L_e                 | in  | distance from hole centre to edge, along the force
L_emin | L_{e,min}           | in  | minimum edge distance for a standard hole, Table J3.4
L_er   | L_{e,req}           | in  | edge distance required for the hole used
l_fg   | l_{fg}              | in  | advisory length of a free edge
L_g    | L_g                 | in  | length of the gusset's edge on the support considered
L_r    | L_r                 | in  | length of the rod
L_s    | L_s                 | in  | span of the plate under the nut
L_v    | L_v                 | in  | gross length of a shear plane
L_w    | L_w                 | in  | Whitmore width
l      | l                   | in  | length of the connection, first to last fastener, or mean length of the welds
l_1    | l_1                 | in  | length of the weld along the heel or the lower edge
l_2    | l_2                 | in  | length of the weld along the toe or the upper edge
l_T    | l_T                 | in  | total length of the welds of one piece
l_t    | l_t                 | in  | length of one transverse weld
l_c    | l_c                 | in  | clear distance, edge of hole to edge of next hole or of the part
l_lap  | l_{lap}             | in  | least lap of a lap joint
l_min  | l_{min}             | in  | least length of a fillet weld
l_w    | l_w                 | in  | length of one weld line
l_we   | l_{we}              | in  | effective length of one weld line
l_0    | l_0                 | in  | lower limit of the lap
l_r    | l_r                 | in  | length of the plates' welds on one side of the net section
lam    | \lambda             |     | slenderness ratio
M_e    | M_e                 | kip·in | moment on the gusset's edge
M_n    | M_n                 | kip·in | nominal flexural strength
mu     | \mu                 |     | mean slip coefficient
n      | n                   |     | number of bolts of the joint
n_a    | n_a                 |     | number of bolts ahead of the chain, already unloaded
N_av   | N_{av}              | kip | available strength of the gusset's edge for a normal force
n_b    | n_b                 |     | number of like bolts
N_e    | N_e                 | kip | force normal to the gusset's edge
n_h    | n_h                 |     | number of holes, or half holes as 0.5
n_j    | n_j                 |     | number of like joints or pieces sharing the load
n_p    | n_p                 |     | number of slip planes
n_s    | n_s                 |     | number of shear planes in the bolt
n_t    | n_t                 | 1/in | threads per inch
n_w    | n_w                 |     | number of like weld lines
n_z    | n_z                 |     | number of like diagonals in a chain
n_v    | n_v                 |     | number of like shear planes
Omega  | \Omega              |     | safety factor
P_br   | P                   | kip | required load of the brace
P_s    | P_s                 | kip | tension at service load
phi    | \phi                |     | resistance factor
P_n    | P_n                 | kip | nominal axial strength
P_a    | \frac{P_n}{\Omega}          | kip | allowable axial strength
P_d    | \phi P_n            | kip | design axial strength
Q_e    | Q_e                 | kip | nominal strength of the gusset's edge, or of its support, for the force on it
q_e    | q_e                 |     | auxiliary value of the interaction
Q_n    | Q_n                 | kip | nominal strength of one joint or piece
r_g    | r_g                 | in  | radius of the Uniform Force Method
R_n    | R_n                 | kip | nominal strength
R_n0   | R_{n,0}             | kip | nominal strength of the bolts before
R_a    | \frac{R_n}{\Omega}          | kip | allowable strength
R_d    | \phi R_n            | kip | design strength
R_nu   | R_{n,u}             | kip | block shear strength, shear rupture
R_ny   | R_{n,y}             | kip | block shear strength, shear yielding
R_wl   | R_{wl}              | kip | nominal strength of the longitudinal welds
R_wt   | R_{wt}              | kip | nominal strength of the transverse welds, no directional increase
R_o    | R                   | in  | outside radius of the tube
R_r    | R_r                 | kip | nominal strength of the welds of the reinforcing plates on one side
r      | r                   | in  | radius of gyration
r_n    | r_n                 | kip | nominal strength of one bolt with its holes
r_nb   | r_{nb}              | kip | nominal bearing strength at one bolt hole
r_nt   | r_{nt}              | kip | nominal tearout strength at one bolt hole
r_nv   | r_{nv}              | kip | nominal shear strength of one bolt
s      | s                   | in  | pitch, spacing along the force
s_max  | s_{max}             | in  | maximum spacing along the member
s_min  | s_{min}             | in  | minimum spacing of hole centres
s_0    | s_0                 | in  | upper limit of the spacing
S_p    | S_p                 | in³ | elastic section modulus of the pin
T_b    | T_b                 | kip | minimum bolt pretension
t      | t                   | in  | thickness of the part considered
t_c    | t_c                 | in  | thickness from which a corner gusset is compact
t_e    | t_e                 | in  | effective throat
t_f    | t_f                 | in  | thickness of the flange
t_fi   | t_{fi}              | in  | total thickness of fillers
t_f0   | t_{f,0}             | in  | thickness of fillers that needs no reduction
t_m    | t_m                 | in  | thickness of the inner ply on the pin
t_p    | t_p                 | in  | thickness of the gusset
t_r    | t_r                 | in  | thickness of one reinforcing plate
t_s    | t_s                 | in  | thickness of one outer ply on the pin
theta  | \theta_w            | rad | angle of spread of the Whitmore width
theta_br | \theta_{br}       | rad | angle between the brace and the axis of the column
theta_ds | \theta_{ds}       | rad | angle between the force and the axis of the weld
theta_e | \theta_e           | rad | angle between the brace and the gusset's edge
theta_g | \theta_g           | rad | half the angle of the tube's arc between the faces of the gusset
U      | U                   |     | shear lag factor
U_2    | U_{(2)}             |     | shear lag factor, case 2
U_4    | U_{(4)}             |     | shear lag factor, case 4
U_7    | U_{(7)}             |     | shear lag factor, case 7
U_8    | U_{(8)}             |     | shear lag factor, case 8
U_A    | U_{A}               |     | shear lag factor, ratio of connected to gross area
U_B    | U_B                 |     | shear lag factor of the walls across the gussets
U_bs   | U_{bs}              |     | block shear factor for the distribution of tension
U_H    | U_H                 |     | shear lag factor of the walls along the gussets
u_N    | u_N                 |     | ratio of the force normal to the edge
U_r    | U_r                 |     | shear lag factor of the reinforcing plates, case 4
u_V    | u_V                 |     | ratio of the shear along the edge
V_av   | V_{av}              | kip | available strength of the gusset's edge in shear
V_b    | V_b                 | kip | vertical force on the beam edge, normal to it
V_c    | V_c                 | kip | vertical force on the column edge, along it
V_e    | V_e                 | kip | shear along the gusset's edge
w      | w                   | in  | width of the part considered
w_b    | w_b                 | in  | width of the eyebar's body that counts
w_e    | w_e                 | in  | effective leg size of the fillet weld
w_f    | w_f                 | in  | leg size of the fillet weld
w_max  | w_{max}             | in  | largest leg size along an edge
w_n    | w_n                 | in  | width of the nut across flats
w_r    | w_r                 | in  | width of one reinforcing plate
w_req  | w_{req}             | in  | least width of the plate at the pin
w_s    | w_s                 | in  | width of the slot
w_w    | w_w                 | in  | width of the square plate washer
x_bar  | \bar{x}             | in  | eccentricity of the connection, connection plane to centroid
x_r    | x_r                 | in  | distance to the middle of a reinforcing plate
x_t    | \bar{x}_t           | in  | eccentricity of half the tube alone
xi     | \xi                 |     | share of the load that is left at the chain
y_c    | y_c                 | in  | centroid of the member from the weld along its heel
y_w    | y_w                 | in  | centroid of the welds from the weld along the heel
xi_g   | \xi_g               |     | share of the member's load carried by the group
xi_r   | \xi_r               |     | share of the member's load in the reinforcing plates
Z_p    | Z_p                 | in³ | plastic section modulus of the pin
Z_t    | Z_t                 | in³ | plastic section modulus of the plate under the nut, flatwise
A_fg   | A_{fg}              | in² | gross area of the tension flange
A_fn   | A_{fn}              | in² | net area of the tension flange
a_q    | a_q                 | in  | bolt centre to the edge of the flange, prying
a_qr   | a_q'                | in  | lever arm of the prying force
alpha_q | \alpha_q           |     | ratio of the moments at bolt line and stem under the load
alpha_qb | \alpha_{q,b}      |     | ratio of the moments that the bolt's reserve allows
alpha_qr | \alpha_q'         |     | ratio of the moments when bolt and flange reach their strength together
B_n    | B_n                 | kip | nominal tensile strength of one bolt
B_q    | B_q                 | kip | available tension of one bolt
b_q    | b_q                 | in  | bolt centre to the face of the stem, leg or web, prying
b_qr   | b_q'                | in  | lever arm of the bolt, prying
beta_q | \beta_q             |     | reserve of the bolt for prying
c_e1   | c_{e1}              | in  | axis of the pull to one edge of the stem
c_e2   | c_{e2}              | in  | axis of the pull to the other edge of the stem
d_q    | d_q                 | in  | width of the hole along the fitting
delta_q | \delta_q           |     | net over gross section along the bolt line
F_nt   | F_{nt}              | ksi | nominal tensile stress of the bolt
F_ntr  | F_{nt}'             | ksi | nominal tensile stress of the bolt that carries shear too
f_rv   | f_{rv}              | ksi | required shear stress of the bolt
g_a    | g_a                 | in  | clear distance between the two angles
k_d    | k_{des}             | in  | outer face of the flange to the web toe of the fillet, as designed
k_n    | k_n                 |     | normal stress at the edge of the stem per unit of load over area
k_sc   | k_{sc}              |     | factor on slip resistance for tension
k_v    | k_v                 |     | shear stress of the stem per unit of load over area, over 0.60
L_f    | L_f                 | in  | length of the fitting along the beam
l_b    | l_b                 | in  | length over which the load enters the web
l_q    | l_q                 | in  | bolt to the end of the fitting
M_nh   | M_{n,h}             | kip·in | nominal flexural strength of the beam at the holes of its tension flange
P_fu   | P_{f,u}             | kip | force at which the net tension flange ruptures
P_fy   | P_{f,y}             | kip | force at which the gross tension flange yields, factored
P_r    | P_r                 | kip | required pull
p_q    | p_q                 | in  | length of flange tributary to one bolt
psi    | \psi                | rad | angle between the pull and the axes of the bolts
Q_q    | Q_q                 |     | share of the bolt's tension left for the load by prying
q_q    | q_q                 | kip | prying force on one bolt
R_s    | R_s                 | kip | nominal slip resistance without tension
R_t    | R_t                 | kip | nominal strength against the component of the pull along the bolts
R_v    | R_v                 | kip | nominal strength against the component of the pull across the bolts
rho_q  | \rho_q              |     | ratio of the lever arms, prying
S_x    | S_x                 | in³ | elastic section modulus about the strong axis
T_q    | T_q                 | kip | required tension of one bolt, prying not included
T_qt   | T_{q,t}             | kip | required tension of one bolt, prying included
T_t    | T_t                 | kip | required tension of all bolts
t_min  | t_{min}             | in  | least thickness of the flange for the load, with prying
t_qc   | t_{q,c}             | in  | thickness at which the bolt reaches its strength without prying
h_s    | h_s                 | in  | face of the fitting on the beam to the last row at the stem
l_e    | l_e                 | in  | lead row or start of the welds to the free edge of the stem
t_np   | t_{np}              | in  | thickness that needs no prying force
Y_t    | Y_t                 |     | factor for the yield ratio of the flange
Z_x    | Z_x                 | in³ | plastic section modulus about the strong axis
Z_y    | Z_y                 | in³ | plastic section modulus about the weak axis
A_SR   | A_{SR}              | in² | area that the stress range is figured on
alpha_s | \alpha_s          |     | factor of the level of seismic force
C_f    | C_f                 |     | constant of the fatigue category
F_100  | F_{100}             | ksi | stress that the fatigue equation of welds' throats is written for
F_1000 | F_{1000}            | ksi | stress that the fatigue equation is written for
f_max  | f_{peak}            | ksi | largest stress at service load
F_max  | F_{peak}            | ksi | limit of the largest stress at service load
f_SR   | f_{SR}              | ksi | stress range
F_SR   | F_{SR}              | ksi | allowable stress range
F_TH   | F_{TH}              | ksi | threshold of the stress range
i_L    | i_L                 |     | impact on the moving part of the live load
n_SR   | n_{SR}              |     | cycles of the stress range in the design life
P_cap  | P_{cap}             | kip | largest force that the system can deliver to the brace
P_exp  | P_{exp}             | kip | strength expected of the brace
P_L    | P_L                 | kip | live load as given
P_Li   | P_{L,i}             | kip | live load with impact
P_m    | P_m                 | kip | moving part of the live load
P_max  | P_{max}             | kip | largest tension at service load
P_n0   | P_{n,0}             | kip | nominal axial strength by the specified minimum tensile strength
P_req  | P_{req}             | kip | required strength of the brace's connection
P_SR   | P_{SR}              | kip | range of the force by live load at service level
P_SRb  | P_{SR,b}            | kip | range of the force in the part considered
R_FIL  | R_{FIL}             |     | reduction for the root of transverse fillets
R_te   | R_{t,e}             |     | expected over specified minimum tensile strength
R_y    | R_y                 |     | expected over specified minimum yield stress
t_l    | t_l                 | in  | thickness of the plate loaded, fatigue
t_ref  | t_{ref}             | in  | thickness that the fatigue equation is written for
""")
