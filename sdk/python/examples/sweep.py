"""
Sweeps one dimension of a shape and prints a table: python3 sweep.py

Reads RHOFORM_URL and RHOFORM_KEY.
"""

import os

import rhoform

client = rhoform.Client(os.environ.get("RHOFORM_URL", "http://127.0.0.1:3000"), key=os.environ["RHOFORM_KEY"])

widths = [0.010 + 0.005 * step for step in range(17)]
items = client.batch(
    rhoform.request_of(
        rhoform.Bar(length="1.2 m", width=width, thickness="10 mm"),
        {"material": "copper-annealed"},
        operating={"temperature": "65 degC"},
        include=[],
    )
    for width in widths
)

print("width/mm,resistance/ohm,lower/ohm,upper/ohm")
for width, item in zip(widths, items):
    if isinstance(item, rhoform.RefusedItem):
        raise SystemExit(f"{width}: {item.problem.detail}")
    found = item.result.resistance
    print(f"{1000 * width:g},{found.value!r},{found.lower!r},{found.upper!r}")
