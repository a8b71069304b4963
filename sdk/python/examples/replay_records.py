"""
Replays all records of the team, for a nightly run: python3 replay_records.py [largest relative drift, 1e-12]

Prints each record that drifted and exits with 1 if there is one. Reads RHOFORM_URL and RHOFORM_KEY; the key needs the
scopes compute and records:read, and field where records of field solutions are among them.
"""

import os
import sys

import rhoform

largest = float(sys.argv[1]) if len(sys.argv) > 1 else 1e-12
client = rhoform.Client(os.environ.get("RHOFORM_URL", "http://127.0.0.1:3000"), key=os.environ["RHOFORM_KEY"])

replayed = 0
drifted = 0
for record in client.pages(client.list_records, limit=100):
    answer = client.replay_record(record.id)
    if isinstance(answer, rhoform.Field):
        # A field solution is replayed as a job.
        ended = rhoform.FieldJob(client, answer).wait(timeout=600)
        if ended.replay is None:
            raise SystemExit(f"{record.label} ({record.id}): {ended.status}")
        drift = ended.replay.drift
    else:
        drift = answer.drift
    replayed += 1
    if drift is None or abs(drift) > largest:
        drifted += 1
        print(f"{record.label} ({record.id}): {drift}")

print(f"{replayed} replayed, {drifted} beyond a drift of {largest:g}")
sys.exit(1 if drifted else 0)
