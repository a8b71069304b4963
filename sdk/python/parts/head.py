"""
Client of the Rhoform API: DC resistances with bounds, from shapes and materials.

One file, standard library only, Python 3.9 and newer. Copy it beside a script or install it; ``python -m rhoform``
makes calls from a shell.

    import os, rhoform

    client = rhoform.Client("http://127.0.0.1:3000", key=os.environ["RHOFORM_KEY"])
    bar = rhoform.Bar(length="1.2 m", width="50 mm", thickness="10 mm")
    answer = client.resistance(bar, {"material": "copper-annealed"}, operating={"temperature": "75 degC"})
    print(answer.resistance.text, answer.resistance.lower, answer.resistance.upper)

Refusals raise RhoformProblem, a service that does not answer RhoformTimeout or RhoformUnreachable.

This file is made by ``npm run generate`` in Rhoform's repository; the parts it is made of are in sdk/python/parts.
"""

from __future__ import annotations

import csv
import dataclasses
import email.utils
import http.client
import io
import json
import os
import re
import socket
import sys
import threading
import time
import urllib.error
import urllib.parse
import urllib.request
import uuid
from dataclasses import dataclass
from typing import Any, Callable, ClassVar, Dict, Iterable, Iterator, List, Mapping, Optional, Sequence, Tuple
from typing import TypeVar, Union
