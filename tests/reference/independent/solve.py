#!/usr/bin/env python3
"""Solves the systems of systems.json with a general-purpose root finder in 40-digit arithmetic and writes answers.json.

Standard Python 3 and mpmath (findroot, multidimensional Newton with numerical derivatives); shares nothing with the engine.
Unknowns: log10 activities of the components, ionic strength, ln water activity, kilograms of water, amounts of the solids that are
present and of the gases that hold a pressure. Equations: mass balance of every component and of water, the definition of ionic
strength, the water activity that Gibbs-Duhem gives for the Davies equation (docs/activity-models.md), saturation of every solid
that is present, the pressures. Which solids are present is stated in the input and proved here: amounts positive, all others
undersaturated.
"""

import json
import os
import sys

from mpmath import findroot, ln, log10, mp, mpf, nstr, power, quad, sqrt

mp.dps = 40
HERE = os.path.dirname(os.path.abspath(__file__))
DIGITS = 25


def davies_log10_gamma(davies, charge, strength):
    root = sqrt(strength)
    return -davies["A"] * charge**2 * (root / (1 + root) - davies["b"] * strength)


def davies_ln_water(davies, molar_mass, strength, sum_of_molalities):
    root = sqrt(strength)
    sigma = (1 + root) - 2 * ln(1 + root) - 1 / (1 + root)
    excess = ln(10) * (davies["A"] * davies["b"] * strength**2 - 2 * davies["A"] * sigma)
    return -molar_mass * (sum_of_molalities + excess)


def check_gibbs_duhem(davies, molar_mass):
    """d ln a_w = -M_w (sum dm + sum m d ln gamma), integrated numerically along a dilution of a CaCl2-like salt."""
    worst = mpf(0)
    for strength in (mpf("0.001"), mpf("0.1"), mpf("0.5"), mpf(3)):
        ions = [(2, strength / 3), (-1, 2 * strength / 3)]
        assert abs(sum(z * z * m for z, m in ions) / 2 - strength) < mpf(10) ** -35

        def slope(s):
            # Along the path every molality is s times its end value, so I = s * strength; x = sqrt(I).
            x = sqrt(s * strength)
            d_log10_gamma = lambda z: -davies["A"] * z * z * (1 / (2 * x * (1 + x) ** 2) - davies["b"]) * strength
            return sum(m + s * m * ln(10) * d_log10_gamma(z) for z, m in ions)

        # s = t^2 takes the square root out of the integrand.
        integral = -molar_mass * quad(lambda t: 2 * t * slope(t * t) if t > 0 else mpf(0), [0, 1])
        closed = davies_ln_water(davies, molar_mass, strength, sum(m for _, m in ions))
        worst = max(worst, abs(integral / closed - 1))
    return worst


class System:
    def __init__(self, data, davies, molar_mass):
        self.data, self.davies, self.molar_mass = data, davies, molar_mass
        self.components = list(data["components"])
        self.species = [(c, z, mpf(0), {c: 1}) for c, z in data["components"].items()]
        self.species += [(s["name"], s["charge"], mpf(s["log10K"]), s["from"]) for s in data["complexes"]]
        self.solids = {s["name"]: (mpf(s["log10K"]), s["from"]) for s in data["solids"]}
        self.gases = {g["name"]: (mpf(g["log10K"]), g["from"]) for g in data["gases"]}
        self.present = data["present"]
        self.fixed = {g: self.pressure(p) for g, p in data["fixed_pressures_atm"].items()}
        self.totals = {c: mpf(data["totals"][c]) for c in self.components}
        self.water = mpf(data["water_kg"]) / molar_mass + mpf(data["further_water_mol"])

    @staticmethod
    def pressure(text):
        """log10 of a pressure in atm."""
        return mpf(text.split()[1]) if text.startswith("log10") else log10(mpf(text))

    def unpack(self, x):
        n = len(self.components)
        activities = dict(zip(self.components, x[:n]))
        strength, ln_water, kilograms = power(10, x[n]), x[n + 1], x[n + 2]
        solids = dict(zip(self.present, x[n + 3 :]))
        gases = dict(zip(self.fixed, x[n + 3 + len(self.present) :]))
        return activities, strength, ln_water, kilograms, solids, gases

    def log10_activity(self, constant, formed_from, activities, ln_water):
        return constant + sum(
            v * (ln_water / ln(10) if c == "H2O" else activities[c]) for c, v in formed_from.items()
        )

    def molalities(self, activities, strength, ln_water):
        return {
            name: power(
                10,
                self.log10_activity(constant, formed_from, activities, ln_water)
                - davies_log10_gamma(self.davies, charge, strength),
            )
            for name, charge, constant, formed_from in self.species
        }

    def residuals(self, x):
        activities, strength, ln_water, kilograms, solids, gases = self.unpack(x)
        molality = self.molalities(activities, strength, ln_water)
        out = []
        for component in self.components + ["H2O"]:
            inside = kilograms / self.molar_mass if component == "H2O" else mpf(0)
            given = self.water if component == "H2O" else self.totals[component]
            gross = abs(inside) + abs(given)
            for name, _, _, formed_from in self.species:
                amount = formed_from.get(component, 0) * molality[name] * kilograms
                inside, gross = inside + amount, gross + abs(amount)
            for name, amount in solids.items():
                part = self.solids[name][1].get(component, 0) * amount
                inside, gross = inside + part, gross + abs(part)
            for name, amount in gases.items():
                part = self.gases[name][1].get(component, 0) * amount
                given, gross = given + part, gross + abs(part)
            out.append((inside - given) / gross)
        charges = {name: charge for name, charge, _, _ in self.species}
        out.append(sum(charges[s] ** 2 * m for s, m in molality.items()) / 2 / strength - 1)
        expected = davies_ln_water(self.davies, self.molar_mass, strength, sum(molality.values()))
        out.append((ln_water - expected) / self.molar_mass)
        for name in self.present:
            out.append(self.log10_activity(*self.solids[name], activities, ln_water))
        for name, pressure in self.fixed.items():
            out.append(self.log10_activity(*self.gases[name], activities, ln_water) - pressure)
        return out

    def solve(self):
        start = self.data["start"]
        x = [mpf(start["log10_activities"][c]) for c in self.components]
        x += [log10(mpf(start["ionic_strength"])), mpf("-0.001"), mpf(start["water_kg"])]
        x += [mpf(start["solids"][s]) for s in self.present] + [mpf(start["gases"][g]) for g in self.fixed]
        root = findroot(lambda *v: self.residuals(list(v)), x, tol=mpf(10) ** -60, maxsteps=200)
        return list(root)

    def answer(self):
        x = self.solve()
        activities, strength, ln_water, kilograms, solids, gases = self.unpack(x)
        worst = max(abs(r) for r in self.residuals(x))
        saturations = {
            name: self.log10_activity(*formation, activities, ln_water) for name, formation in self.solids.items()
        }
        for name, amount in solids.items():
            if amount <= 0:
                raise SystemExit(f"{self.data['name']}: {name} was said to be present, but its amount is {nstr(amount, 5)}")
        for name, saturation in saturations.items():
            if name not in solids and saturation > 0:
                raise SystemExit(f"{self.data['name']}: {name} was said to be absent, but log10 Omega is {nstr(saturation, 5)}")
        text = lambda v: nstr(v, DIGITS, strip_zeros=False, min_fixed=0, max_fixed=0)
        return {
            "name": self.data["name"],
            "worst_residual": nstr(worst, 2),
            "pH": text(-activities["H+"]),
            "ionic_strength": text(strength),
            "ln_water_activity": text(ln_water),
            "water_kg": text(kilograms),
            "log10_activities": {c: text(a) for c, a in activities.items()},
            "molalities": {s: text(m) for s, m in self.molalities(activities, strength, ln_water).items()},
            "log10_gamma": {
                name: text(davies_log10_gamma(self.davies, charge, strength)) if charge else "0"
                for name, charge, _, _ in self.species
            },
            "solid_amounts": {s: text(solids[s]) if s in solids else "0" for s in self.solids},
            "log10_saturations": {s: "0" if s in solids else text(v) for s, v in saturations.items()},
            "gas_amounts": {g: text(a) for g, a in gases.items()},
        }


def main():
    with open(os.path.join(HERE, "systems.json"), encoding="utf-8") as file:
        data = json.load(file)
    davies = {"A": mpf(data["davies"]["A"]), "b": mpf(data["davies"]["b"])}
    molar_mass = mpf(data["water_molar_mass_kg_per_mol"])
    gibbs_duhem = check_gibbs_duhem(davies, molar_mass)
    if gibbs_duhem > mpf(10) ** -30:
        raise SystemExit(f"the water activity breaks Gibbs-Duhem by {nstr(gibbs_duhem, 3)}")
    answers = {
        "about": "Written by solve.py from systems.json; 25 significant digits. Do not edit.",
        "gibbs_duhem_relative_gap": nstr(gibbs_duhem, 2),
        "answers": [System(s, davies, molar_mass).answer() for s in data["systems"]],
    }
    path = os.path.join(HERE, "answers.json")
    written = json.dumps(answers, indent=2, ensure_ascii=False) + "\n"
    if "--check" in sys.argv:
        with open(path, encoding="utf-8") as file:
            sys.exit(0 if file.read() == written else "answers.json is out of date")
    with open(path, "w", encoding="utf-8", newline="\n") as file:
        file.write(written)


if __name__ == "__main__":
    main()
