"""Writes the teos10-*.csv tables of src/test/resources/reference/.

Density, heat capacity and practical salinity by GSW-Python, the library of the International thermodynamic equation of
seawater 2010 (TEOS-10), which knows nothing of this project. On Debian:

    apt-get install python3-gsw
    /usr/bin/python3 src/test/reference-scripts/teos10.py

Temperatures are ITS-90, conductivities mS/cm, pressures dbar. The water has the composition of standard seawater:
absolute salinity is the reference salinity of the practical one.
"""

import pathlib

import gsw

HERE = pathlib.Path(__file__).resolve().parent
TABLES = HERE.parent / "resources" / "reference"
SOURCE = f"GSW-Python {gsw.__version__} (TEOS-10)"


def write(name, lines, header, rows):
    with open(TABLES / name, "w", encoding="utf-8") as table:
        for line in [f"{lines} {SOURCE}.", "Written by src/test/reference-scripts/teos10.py; ITS-90 temperatures."]:
            table.write(f"# {line}\n")
        table.write(header + "\n")
        for row in rows:
            table.write(",".join(f"{value:.12g}" for value in row) + "\n")


def freezing(salinity):
    return gsw.t_freezing(gsw.SR_from_SP(salinity), 0, 0)


def properties():
    for salinity in (0, 2, 5, 10, 15, 20, 25, 30, 33, 35, 37, 40, 42):
        for temperature in (-1.5, 0, 2, 5, 8, 10, 12, 15, 18, 20, 22, 25, 28, 30, 35, 40):
            if temperature > freezing(salinity):
                sa = gsw.SR_from_SP(salinity)
                yield (
                    temperature,
                    salinity,
                    gsw.rho_t_exact(sa, temperature, 0),
                    gsw.cp_t_exact(sa, temperature, 0),
                )


def salinities():
    for pressure in (0, 10, 1000):
        for temperature in (-1, 0, 5, 10, 15, 20, 25, 30, 35):
            for conductivity in (0.2, 0.5, 1, 1.5, 2, 2.5, 3, 3.5, 4, 6, 10, 15, 20, 25, 30, 35, 40, 45, 50, 55, 60):
                salinity = gsw.SP_from_C(conductivity, temperature, pressure)
                if salinity <= 42:
                    yield conductivity, temperature, pressure, salinity


def conductivities():
    for pressure in (0, 10, 1000):
        for temperature in (-1, 0, 5, 10, 15, 20, 25, 30, 35):
            for salinity in (0.1, 0.5, 1, 1.9, 2.1, 3, 5, 10, 15, 20, 25, 30, 33, 35, 37, 40, 42):
                yield salinity, temperature, pressure, gsw.C_from_SP(salinity, temperature, pressure)


write(
    "teos10-density.csv",
    "Density (kg/m3) and heat capacity (J/(kg K)) of standard seawater at 1 atm by",
    "temperatureC,salinity,densityKgM3,heatCapacity",
    properties(),
)
write(
    "teos10-salinity.csv",
    "Practical salinity of a conductivity by",
    "conductivityMsCm,temperatureC,pressureDbar,salinity",
    salinities(),
)
write(
    "teos10-conductivity.csv",
    "Conductivity of a practical salinity by",
    "salinity,temperatureC,pressureDbar,conductivityMsCm",
    conductivities(),
)
