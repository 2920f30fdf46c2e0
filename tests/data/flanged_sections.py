"""Area, centroid and second moment of area of flanged returns by a general library.

Makes flanged_sections.json, which the tests read; nothing here runs with the tests.
Needs the Python package sectionproperties (3.x). A section is read from the toe: width b_1 over
the depth d_1, then width b_2 to the depth L_s, all in mm, one above the other.
"""

import json
import pathlib

from sectionproperties.analysis import Section
from sectionproperties.pre.library import rectangular_section

CASES = [
    (100.0, 890.0, 1300.0, 990.0),
    (1300.0, 100.0, 100.0, 990.0),
    (215.0, 600.0, 1505.0, 815.0),
    (1505.0, 215.0, 215.0, 815.0),
    (140.0, 1200.0, 640.0, 1340.0),
    (500.0, 100.0, 100.0, 700.0),
    (102.5, 440.0, 102.5, 542.5),
]

rows = []
for b_1, d_1, b_2, l_s in CASES:
    first = rectangular_section(d=d_1, b=b_1).shift_section(x_offset=-b_1 / 2, y_offset=0)
    second = rectangular_section(d=l_s - d_1, b=b_2).shift_section(x_offset=-b_2 / 2, y_offset=d_1)
    geometry = first + second
    geometry.create_mesh(mesh_sizes=[d_1 * b_1 / 50])
    section = Section(geometry)
    section.calculate_geometric_properties()
    _, y = section.get_c()
    ixx, _, _ = section.get_ic()
    rows.append(
        {"b_1": b_1, "d_1": d_1, "b_2": b_2, "L_s": l_s, "area": section.get_area(), "centroid": y, "second_moment": ixx}
    )

pathlib.Path(__file__).with_suffix(".json").write_text(json.dumps(rows, indent=1) + "\n")
