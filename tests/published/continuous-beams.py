"""Makes continuous-beams.json: random beams worked out by SymPy's beam module, to compare ours with.

Run with a Python that has SymPy (Debian: python3-sympy):  python3 continuous-beams.py > continuous-beams.json
Numbers are exact rationals until they are printed. E I = 1. Lengths in, loads lb and lb/in, downward positive.
"""

import json
import random
import sys

import sympy
from sympy import Rational, Symbol, symbols
from sympy.physics.continuum_mechanics.beam import Beam

SEED = 20180101
COUNT = 48
PROBES = 9


def arrangement(i):
    """Every kind of beam in turn: 1 to 6 spans, overhangs, fixed ends, cantilevers."""
    if i % 12 == 11:
        return {
            "spans": [random.randint(40, 200)],
            "overhangs": {"left": 0, "right": 0},
            "supports": "cantilever",
            "fixed": {"left": False, "right": False},
        }
    spans = [random.randint(40, 240) for _ in range(1 + i % 6)]
    return {
        "spans": spans,
        "overhangs": {
            "left": random.choice([0, random.randint(10, 80)]),
            "right": random.choice([0, random.randint(10, 80)]),
        },
        "supports": "bearings",
        "fixed": {"left": random.random() < 0.25, "right": random.random() < 0.25},
    }


def random_loads(length):
    loads = []
    for _ in range(random.randint(1, 4)):
        if random.random() < 0.4:
            loads.append({"type": "point", "at": random.randint(0, length), "load": random.randint(-300, 900)})
            continue
        a, b = sorted(random.sample(range(length + 1), 2))
        start = random.randint(-5, 20)
        end = start if random.random() < 0.4 else random.randint(-5, 20)
        loads.append({"type": "line", "from": a, "to": b, "start": start, "end": end})
    return loads


def solve(beam, loads):
    """Reactions (up positive), then V, M, deflection at places that are no jumps."""
    cantilever = beam["supports"] == "cantilever"
    total = beam["overhangs"]["left"] + sum(beam["spans"]) + beam["overhangs"]["right"]
    places = [beam["overhangs"]["left"]]
    for span in beam["spans"]:
        places.append(places[-1] + span)
    if cantilever:
        places = [0]
    model = Beam(total, 1, 1)
    unknown = []
    forces = []
    for i, at in enumerate(places):
        force = Symbol(f"R{i}")
        model.apply_load(force, at, -1)
        model.bc_deflection.append((at, 0))
        unknown.append(force)
        forces.append(force)
        held = cantilever or (i == 0 and beam["fixed"]["left"]) or (i == len(places) - 1 and beam["fixed"]["right"])
        if held:
            moment = Symbol(f"K{i}")
            model.apply_load(moment, at, -2)
            model.bc_slope.append((at, 0))
            unknown.append(moment)
    for load in loads:
        if load["type"] == "point":
            model.apply_load(-load["load"], load["at"], -1)
            continue
        growth = Rational(load["end"] - load["start"], load["to"] - load["from"])
        if load["start"] != 0:
            model.apply_load(-load["start"], load["from"], 0, load["to"])
        if growth != 0:
            model.apply_load(-growth, load["from"], 1, load["to"])
    model.solve_for_reaction_loads(*unknown)
    x = symbols("x")
    jumps = set(places) | {load["at"] for load in loads if load["type"] == "point"}
    probes = []
    while len(probes) < PROBES:
        at = Rational(random.randint(1, 16 * total - 1), 16)
        if at not in jumps:
            probes.append(at)
    # SymPy keeps the user's signs. With upward loads positive its shear and moment come out as the negatives of ours
    # (shear positive where the left part pushes up, moment positive where the beam sags), deflection positive upward.
    shear, moment, deflection = model.shear_force(), model.bending_moment(), model.deflection()
    return {
        "reactions": [float(model.reaction_loads[force]) for force in forces],
        "probes": [
            {
                "x": float(place),
                "shear": float(-shear.subs(x, place)),
                "moment": float(-moment.subs(x, place)),
                "deflection": float(-deflection.subs(x, place)),
            }
            for place in sorted(probes)
        ],
    }




def main():
    random.seed(SEED)
    cases = []
    for i in range(COUNT):
        beam = arrangement(i)
        length = beam["overhangs"]["left"] + sum(beam["spans"]) + beam["overhangs"]["right"]
        loads = random_loads(length)
        cases.append({"beam": beam, "loads": loads, **solve(beam, loads)})
        print(i + 1, "of", COUNT, file=sys.stderr)
    source = f"SymPy {sympy.__version__}, sympy.physics.continuum_mechanics.beam, by continuous-beams.py, seed {SEED}"
    # One case a line: readable in a diff, small on disk.
    print(json.dumps({"source": source, "library": {"name": "SymPy", "version": sympy.__version__}})[:-1] + ', "cases": [')
    print(",\n".join(json.dumps(case) for case in cases))
    print("]}")


if __name__ == "__main__":
    main()
