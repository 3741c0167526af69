"""A third opinion in exact fractions: the textbook 6 by 6 member stiffness, assembled and solved without rounding.

Reads {"analyses": [...]} in the engine's form on standard input and writes {"answers": [...]} with reactions, end moments
and joint displacements of the first case as fractions "p/q". Needs nothing but Python's standard library.

Covers: members of rational length and even stiffness, with EA or inextensible (a constraint each), moment releases;
supports at angle 0, springs, settlements; uniform and point loads across the member, joint loads. Anything else is an
error, never a guess. Member matrix and fixed-end moments: Weaver and Gere, Matrix Analysis of Framed Structures, ch. 2
and appendix B (from memory).
"""

import json
import sys
from fractions import Fraction
from math import isqrt


def exact(number):
    """The decimal that was written, not the binary that holds it."""
    return Fraction(repr(number)) if isinstance(number, float) else Fraction(number)


def root(square):
    n, d = isqrt(square.numerator), isqrt(square.denominator)
    if n * n != square.numerator or d * d != square.denominator:
        raise ValueError("a member of irrational length")
    return Fraction(n, d)


def solve_exactly(rows, right):
    """Gaussian elimination; the first entry that is not zero is the pivot, since nothing is ever rounded."""
    n = len(rows)
    table = [row[:] + [b] for row, b in zip(rows, right)]
    for k in range(n):
        pivot = next((i for i in range(k, n) if table[i][k] != 0), None)
        if pivot is None:
            raise ValueError("singular")
        table[k], table[pivot] = table[pivot], table[k]
        for i in range(k + 1, n):
            if table[i][k] == 0:
                continue
            factor = table[i][k] / table[k][k]
            table[i] = [a - factor * b if b else a for a, b in zip(table[i], table[k])]
    x = [Fraction(0)] * n
    for k in reversed(range(n)):
        x[k] = (table[k][n] - sum(table[k][j] * x[j] for j in range(k + 1, n))) / table[k][k]
    return x


def member_matrix(L, EI, EA):
    """Local axes: along, across and turning at start and end; forces that the joints put on the member."""
    a, b, c, d = 12 * EI / L**3, 6 * EI / L**2, 4 * EI / L, 2 * EI / L
    e = EA / L
    return [
        [e, 0, 0, -e, 0, 0],
        [0, a, b, 0, -a, b],
        [0, b, c, 0, -b, d],
        [-e, 0, 0, e, 0, 0],
        [0, -a, -b, 0, a, -b],
        [0, b, d, 0, -b, c],
    ]


def fixed_ends(load, L):
    """Forces that hold both ends of the loaded member still; the load across is positive to the left of the walk."""
    if load["kind"] == "distributed":
        if load["w1"] != load["w2"] or "from" in load or "to" in load:
            raise ValueError("only full uniform loads")
        w = exact(load["w1"])
        return [0, -w * L / 2, -w * L**2 / 12, 0, -w * L / 2, w * L**2 / 12]
    p, a = exact(load["value"]), exact(load["at"])
    b = L - a
    return [
        0,
        -p * b**2 * (3 * a + b) / L**3,
        -p * a * b**2 / L**2,
        0,
        -p * a**2 * (a + 3 * b) / L**3,
        p * a**2 * b / L**2,
    ]


def condense(k, f, place):
    """Strikes out the moment at a hinge."""
    pivot = k[place][place]
    column = [row[place] for row in k]
    row, force = k[place], f[place]
    f = [f[i] - column[i] * force / pivot for i in range(6)]
    k = [[k[i][j] - column[i] * row[j] / pivot for j in range(6)] for i in range(6)]
    return k, f


def answer(analysis):
    joints = {j["id"]: i for i, j in enumerate(analysis["joints"])}
    points = [(exact(j["x"]), exact(j["y"])) for j in analysis["joints"]]
    loads = analysis["cases"][0]["loads"]
    n = 3 * len(points)
    K = [[Fraction(0)] * n for _ in range(n)]
    P = [Fraction(0)] * n
    constraints, members, turned = [], [], set()
    for m in analysis["members"]:
        a, b = joints[m["start"]], joints[m["end"]]
        dx, dy = points[b][0] - points[a][0], points[b][1] - points[a][1]
        L = root(dx * dx + dy * dy)
        c, s = dx / L, dy / L
        stiff = "EA" in m
        k = member_matrix(L, exact(m["EI"]), exact(m["EA"]) if stiff else Fraction(0))
        f = [Fraction(0)] * 6
        for load in loads:
            if load.get("member") != m["id"]:
                continue
            if load["direction"] != "across":
                raise ValueError("only loads across the member")
            f = [x + y for x, y in zip(f, fixed_ends(load, L))]
        releases = m.get("releases", {})
        for end, place in (("start", 2), ("end", 5)):
            kinds = releases.get(end, [])
            if any(kind != "moment" for kind in kinds):
                raise ValueError("only moment releases")
            if kinds:
                k, f = condense(k, f, place)
            else:
                turned.add(a if end == "start" else b)
        turn = [[c, s, 0, 0, 0, 0], [-s, c, 0, 0, 0, 0], [0, 0, 1, 0, 0, 0]]
        turn += [[0, 0, 0] + row[:3] for row in turn]
        places = [3 * a, 3 * a + 1, 3 * a + 2, 3 * b, 3 * b + 1, 3 * b + 2]
        local = [[sum(k[i][q] * turn[q][j] for q in range(6)) for j in range(6)] for i in range(6)]
        for i in range(6):
            for j in range(6):
                K[places[i]][places[j]] += sum(turn[q][i] * local[q][j] for q in range(6))
            P[places[i]] -= sum(turn[q][i] * f[q] for q in range(6))
        members.append((m["id"], places, local, f))
        if not stiff:
            row = {places[0]: -c, places[1]: -s, places[3]: c, places[4]: s}
            constraints.append((row, Fraction(0)))
    for load in loads:
        if load["kind"] != "joint":
            continue
        for i, key in enumerate(("x", "y", "couple")):
            P[3 * joints[load["joint"]] + i] += exact(load.get(key, 0))
    reactions = []
    for j, joint in enumerate(analysis["joints"]):
        support = joint.get("support")
        if support and support.get("angle", 0) != 0:
            raise ValueError("only supports at angle 0")
        for i, component in enumerate(("x", "y", "turn")):
            kind = support[component] if support else "free"
            place = 3 * j + i
            if kind == "held":
                moved = [
                    exact(s["value"])
                    for s in loads
                    if s["kind"] == "settlement" and s["joint"] == joint["id"] and s["component"] == component
                ]
                constraints.append(({place: Fraction(1)}, sum(moved, Fraction(0))))
                reactions.append((joint["id"], component, "held", n + len(constraints) - 1))
            elif kind != "free":
                stiffness = exact(kind["spring"])
                K[place][place] += stiffness
                reactions.append((joint["id"], component, stiffness, place))
        if j not in turned and not (support and support["turn"] != "free"):
            constraints.append(({3 * j + 2: Fraction(1)}, Fraction(0)))
    size = n + len(constraints)
    rows = [K[i] + [Fraction(0)] * len(constraints) for i in range(n)]
    rows += [[Fraction(0)] * size for _ in constraints]
    right = P + [value for _, value in constraints]
    for q, (row, _) in enumerate(constraints):
        for place, value in row.items():
            rows[n + q][place] = value
            rows[place][n + q] = -value
    x = solve_exactly(rows, right)
    found = {}
    for joint, component, kind, place in reactions:
        found[f"{joint}:{component}"] = x[place] if kind == "held" else -kind * x[place]
    moments = {}
    for name, places, local, f in members:
        end = [f[i] + sum(local[i][j] * x[places[j]] for j in range(6)) for i in (2, 5)]
        moments[name] = [str(-end[0]), str(end[1])]
    motions = {j["id"]: [str(x[3 * i]), str(x[3 * i + 1])] for i, j in enumerate(analysis["joints"])}
    return {"reactions": {k: str(v) for k, v in found.items()}, "moments": moments, "joints": motions}


if __name__ == "__main__":
    print(json.dumps({"answers": [answer(a) for a in json.load(sys.stdin)["analyses"]]}))
