"""
Fills a parts list: python3 parts_list.py parts.csv answered.csv

Each row is a request, with the columns that POST /resistance/batch knows; the answered table has the resistance, its
bounds and, where a row was refused, the reason. Exits with 1 if a row was refused. Reads RHOFORM_URL and RHOFORM_KEY.
"""

import csv
import os
import sys

import rhoform

if len(sys.argv) != 3:
    raise SystemExit(__doc__)
source, target = sys.argv[1:]

client = rhoform.Client(os.environ.get("RHOFORM_URL", "http://127.0.0.1:3000"), key=os.environ["RHOFORM_KEY"])
with open(source, encoding="utf-8-sig", newline="") as file:
    answered = client.compute_batch(file.read(), format="csv")
with open(target, "w", encoding="utf-8", newline="") as file:
    file.write(answered)

rows = list(csv.DictReader(answered.splitlines()))
refused = [row for row in rows if row["status"] != "200"]
for row in refused:
    print(f"{row.get('label') or row['shape']}: {row['problem']}", file=sys.stderr)
print(f"{len(rows) - len(refused)} answered, {len(refused)} refused, written to {target}")
sys.exit(1 if refused else 0)
