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



__version__ = "1.0.0"

__all__ = [
    "AnsweredItem",
    "AnsweredNetwork",
    "AnsweredNetworkCheck",
    "AnsweredNetworkElement",
    "AnsweredNetworkElementBounds",
    "AnsweredNetworkNode",
    "AnsweredNetworkResistance",
    "AnsweredNetworkUncertainty",
    "AnsweredNetworkUncertaintyContribution",
    "AnsweredResistance",
    "AnsweredResistanceCheck",
    "AnsweredResistanceConductance",
    "AnsweredResistanceMaterial",
    "AnsweredResistanceOperating",
    "AnsweredResistancePeak",
    "AnsweredResistancePeakCurrentDensity",
    "AnsweredResistancePeakCurrentDensity2",
    "AnsweredResistancePeakCurrentDensityPosition",
    "AnsweredResistancePeakField",
    "AnsweredResistancePeakPosition",
    "AnsweredResistanceProfile",
    "AnsweredResistanceProfileAcross",
    "AnsweredResistanceQuadrature",
    "AnsweredResistanceRecord",
    "AnsweredResistanceStep",
    "AnsweredSizing",
    "AnsweredSizingTarget",
    "AnsweredSizingWithin",
    "ArcBar",
    "Bar",
    "BatchAnswer",
    "BatchAnswerCounts",
    "BentTube",
    "BoundedResistance",
    "BoxTube",
    "Catalogue",
    "CladWire",
    "Client",
    "ConeFrustum",
    "ConfocalShell",
    "ConicalShell",
    "ContactSpot",
    "CylinderInSquare",
    "CylinderPlane",
    "CylindricalShell",
    "EarthGrid",
    "EarthHemisphere",
    "EarthPlate",
    "EarthRing",
    "EarthRod",
    "EarthRodGroup",
    "EarthRodLayered",
    "EarthRodPair",
    "EarthStar",
    "EarthWire",
    "EccentricCylinders",
    "EllipticContactSpot",
    "EtchedTrace",
    "Field",
    "FieldJob",
    "FieldLine",
    "FieldMap",
    "FieldMapEdge",
    "FieldMapEquipotential",
    "FieldMapRaster",
    "FieldProgress",
    "FieldRecord",
    "FieldReplay",
    "FieldReplayBefore",
    "FieldReplayRecord",
    "FieldResult",
    "FieldResultConductanceBounds",
    "FieldResultMesh",
    "FieldResultPair",
    "FieldResultPairFloating",
    "FieldResultPairGrounded",
    "FieldResultPeak",
    "FieldResultPeakCurrentDensity",
    "FieldResultPeakDistance",
    "FieldResultPeakField",
    "FieldResultPeakPosition",
    "FieldResultResistance",
    "FieldResultSquares",
    "FlatSpiral",
    "Health",
    "HelicalWinding",
    "HyperbolicNeck",
    "IssuedKey",
    "Key",
    "KeyPage",
    "KeyQuotas",
    "Material",
    "MaterialPage",
    "MaterialRange",
    "MaterialResistivity",
    "MaterialResistivity2",
    "MaterialResistivity3",
    "MaterialResistivity4",
    "MaterialResistivity5",
    "MaterialResistivity6",
    "MaterialUncertainty",
    "NetworkResult",
    "Outline",
    "OutlineOutline",
    "OutlineOutlineOuter2",
    "OutlineTerminal",
    "OutlineTerminalPart",
    "ParallelCylinders",
    "ParallelPlates",
    "Prism",
    "Quantity",
    "ReadOpenApiAnswer",
    "Record",
    "RecordBy",
    "RecordMaterial",
    "RecordPage",
    "RefusedItem",
    "RefusedItemProblem",
    "RefusedItemProblemError",
    "RefusedItemProblemError2",
    "Replay",
    "ResistanceResult",
    "RhoformError",
    "RhoformProblem",
    "RhoformStopped",
    "RhoformTimeout",
    "RhoformUnreachable",
    "RotatedKey",
    "RoundWire",
    "Shape",
    "ShapeConstraint",
    "ShapeCoordinate",
    "ShapeDimension",
    "ShapeDimensionChoice",
    "ShapeDimensionRange",
    "ShapeMedia",
    "ShapeMediaName",
    "ShapeSource",
    "ShapeTerminals",
    "SheetBend",
    "SheetDisc",
    "SheetEndTerminal",
    "SheetMeander",
    "SheetSlit",
    "SheetStep",
    "SheetStrip",
    "SheetTee",
    "SizingResult",
    "SizingSolution",
    "SphereBuried",
    "SpherePair",
    "SpherePlane",
    "SphericalShell",
    "Spheroid",
    "SpotInCylinder",
    "StrandedConductor",
    "TaperedStrip",
    "TorusArc",
    "Tube",
    "Uncertainty",
    "UncertaintyContribution",
    "Usage",
    "UsageByDay",
    "UsageMinute",
    "UsageMonth",
    "ViaBarrel",
    "main",
    "request_of",
    "to_dict",
]


# Hand-written: sdk/python/parts/transport.py


class RhoformError(Exception):
    """Whatever goes wrong with a call. No message holds the key."""


class RhoformProblem(RhoformError):
    """The service refused the call; the members are those of its problem document (RFC 9457)."""

    def __init__(
        self,
        status: int,
        code: str,
        title: str,
        detail: str,
        errors: Sequence[Mapping[str, str]] = (),
        request_id: Optional[str] = None,
        retry_after: Optional[float] = None,
    ) -> None:
        lines = [f"{status} {title}: {detail}"]
        for error in errors:
            place = error.get("pointer") or error.get("parameter") or ""
            lines.append(f"  {place} {error.get('detail', '')}")
        super().__init__("\n".join(lines))
        self.status = status
        #: The problem's code, such as "invalid-input" or "quota-exhausted".
        self.code = code
        self.title = title
        self.detail = detail
        #: For a 422: every complaint, each with the pointer or the parameter it is about.
        self.errors = tuple(errors)
        #: Id of the request, to quote to whoever runs the service.
        self.request_id = request_id
        #: Seconds to wait before another try, where the answer says so.
        self.retry_after = retry_after


class RhoformTimeout(RhoformError):
    """The service did not answer in time."""


class RhoformUnreachable(RhoformError):
    """The service could not be reached, or the connection broke."""


class RhoformStopped(RhoformError):
    """The caller stopped the work."""


# Refused before anything was done: a repeat is safe whatever the method.
_NOT_DONE = frozenset((429, 503))
# From something between us and the service: a repeat is safe only where the call may be made twice.
_BROKEN = frozenset((502, 504))
_KEY = re.compile(r"rho_[A-Za-z0-9_-]+")
_PIECE = 1 << 16


class _Answer:
    """What came back, whatever its status."""

    def __init__(self, status: int, headers: Mapping[str, str], body: bytes) -> None:
        self.status = status
        self.headers = headers
        self.body = body

    @property
    def text(self) -> str:
        return self.body.decode("utf-8", "replace")

    @property
    def media_type(self) -> str:
        return (self.headers.get("Content-Type") or "").split(";")[0].strip().lower()

    def content(self) -> Any:
        """JSON as Python values, anything else as text; None where it is empty."""
        if not self.body:
            return None
        return json.loads(self.text) if self.media_type.endswith("json") else self.text


class _NoRedirects(urllib.request.HTTPRedirectHandler):
    """The key goes to the address it was meant for and to no other."""

    def redirect_request(self, *_args: Any, **_kwargs: Any) -> None:
        return None


class _Transport:
    """Sends calls, waits as the service asks, and tries again where that cannot do harm."""

    def __init__(
        self,
        base_url: str,
        key: Optional[str] = None,
        *,
        timeout: float = 30.0,
        retries: int = 2,
        max_wait: float = 60.0,
    ) -> None:
        """
        :param base_url: where the service is reached, without the path of the API.
        :param key: a key, ``rho_...``; without one only the catalogue and the document can be read.
        :param timeout: seconds that one try may take.
        :param retries: further tries after a refusal for the moment or a broken connection.
        :param max_wait: longest wait between two tries, seconds.
        """
        parts = urllib.parse.urlsplit(base_url)
        if parts.scheme not in ("http", "https") or not parts.netloc:
            raise ValueError('base_url is no address; it has the form "https://rhoform.example".')
        if key is not None and not _KEY.fullmatch(key):
            raise ValueError("The key does not look like one: it begins with rho_ and has no spaces or quotes.")
        origin = re.sub(r"/api/v1$", "", base_url.rstrip("/"))
        self._base = f"{origin}/api/v1"
        self._host = parts.netloc.rpartition("@")[2]
        self._timeout = timeout
        self._retries = retries
        self._max_wait = max_wait
        opener = urllib.request.build_opener(_NoRedirects())

        def send(request: urllib.request.Request, seconds: float) -> Any:
            # In a closure, so that printing the client does not print the key.
            if key is not None:
                request.add_unredirected_header("Authorization", f"Bearer {key}")
            return opener.open(request, timeout=seconds)

        self._send = send
        # An answer that repeats the key, as the page of a proxy may, is told without it.
        self._hide = lambda text: text if key is None else text.replace(key, "rho_...")

    def __repr__(self) -> str:
        return f"{type(self).__name__}({self._base!r})"

    def call(
        self,
        method: str,
        path: str,
        *,
        query: Optional[Mapping[str, Any]] = None,
        body: Any = None,
        headers: Optional[Mapping[str, str]] = None,
        timeout: Optional[float] = None,
        repeatable: Optional[bool] = None,
    ) -> Any:
        """
        Makes one call below ``/api/v1`` and answers with its content as plain values.

        A text body is sent as it is with the Content-Type in ``headers``, anything else as JSON.
        :raises RhoformProblem: where the service refuses.
        :raises RhoformTimeout: where it does not answer in time.
        :raises RhoformUnreachable: where it cannot be reached.
        """
        pairs = [(name, _plain(value)) for name, value in (query or {}).items() if value is not None]
        texts = [(name, str(value).lower() if isinstance(value, bool) else str(value)) for name, value in pairs]
        url = self._base + path + (f"?{urllib.parse.urlencode(texts)}" if texts else "")
        sent = {"Accept": "application/json, */*;q=0.5", "User-Agent": f"rhoform-python/{__version__}"}
        sent.update({name: value for name, value in (headers or {}).items() if value is not None})
        data: Optional[bytes] = None
        if isinstance(body, str):
            data = body.encode("utf-8")
        elif body is not None:
            data = json.dumps(_plain(body), allow_nan=False).encode("utf-8")
            sent.setdefault("Content-Type", "application/json")
        if repeatable is None:
            repeatable = method == "GET" or "Idempotency-Key" in sent
        answer = self._persist(method, url, data, sent, timeout or self._timeout, repeatable)
        if answer.status >= 300:
            raise _problem_of(answer, self._hide)
        return answer.content()

    def _persist(
        self, method: str, url: str, data: Optional[bytes], headers: Mapping[str, str], timeout: float, repeatable: bool
    ) -> _Answer:
        tries = 0
        while True:
            last = tries >= self._retries
            wait = min(0.5 * 2**tries, self._max_wait)
            try:
                answer = self._attempt(method, url, data, headers, timeout)
            except (RhoformTimeout, RhoformUnreachable):
                if last or not repeatable:
                    raise
            else:
                again = answer.status in _NOT_DONE or (repeatable and answer.status in _BROKEN)
                if last or not again:
                    return answer
                asked = _retry_after(answer.headers.get("Retry-After"))
                if asked is not None:
                    wait = asked
                if wait > self._max_wait:
                    return answer
            time.sleep(wait)
            tries += 1

    def _attempt(
        self, method: str, url: str, data: Optional[bytes], headers: Mapping[str, str], timeout: float
    ) -> _Answer:
        request = urllib.request.Request(url, data=data, headers=dict(headers), method=method)
        end = time.monotonic() + timeout
        try:
            try:
                response = self._send(request, timeout)
            except urllib.error.HTTPError as refused:
                response = refused
            with response:
                pieces: List[bytes] = []
                while True:
                    if time.monotonic() > end:
                        raise socket.timeout()
                    # What has arrived, and not all of it: a slow body must not outlast the time.
                    piece = response.read1(_PIECE)
                    if not piece:
                        break
                    pieces.append(piece)
                if getattr(response, "length", None):
                    raise http.client.IncompleteRead(b"")
                return _Answer(response.status, response.headers, b"".join(pieces))
        except (OSError, http.client.HTTPException) as error:
            # The kind of trouble alone: an error of the network layer may hold the request, and with it the key.
            cause = getattr(error, "reason", error)
            late = isinstance(cause, (socket.timeout, TimeoutError))
            name = getattr(cause, "strerror", None) or type(cause).__name__
        if late:
            raise RhoformTimeout(f"The service did not answer within {timeout:g} s.")
        raise RhoformUnreachable(f"The service at {self._host} could not be reached: {name}")


def _problem_of(answer: _Answer, hide: Callable[[str], str]) -> RhoformProblem:
    """What a refused answer says; anything that is no problem document is told by its status."""
    try:
        content = _Answer(answer.status, answer.headers, hide(answer.text).encode("utf-8")).content()
    except ValueError:
        content = None
    problem = content if isinstance(content, dict) else {}
    detail = problem.get("detail") or (content if isinstance(content, str) and len(content) < 300 else "")
    return RhoformProblem(
        answer.status,
        str(problem.get("type") or "unknown").rpartition("/")[2],
        str(problem.get("title") or http.client.responses.get(answer.status) or "The call was refused"),
        str(detail or "the answer is no problem document."),
        [error for error in problem.get("errors") or [] if isinstance(error, dict)],
        problem.get("instance") or answer.headers.get("Request-Id"),
        _retry_after(answer.headers.get("Retry-After")),
    )


def _retry_after(header: Optional[str]) -> Optional[float]:
    """``Retry-After`` in seconds, given as a number or as a date; None where there is none."""
    text = (header or "").strip()
    if text.isdigit():
        return float(text)
    try:
        then = email.utils.parsedate_to_datetime(text)
    except (TypeError, ValueError):
        return None
    if then is None:
        return None
    return max(0.0, then.timestamp() - time.time())


def _new_idempotency_key() -> str:
    return uuid.uuid4().hex


# Hand-written: sdk/python/parts/values.py

#: A bare number in SI (temperatures in degrees Celsius, angles in degrees) or a text with its unit, "0.25 mm"; where
#: the documentation allows a tolerance also a mapping, {"value": "10 mm", "tolerance": "1 %"}.
Quantity = Union[float, int, str, Mapping[str, Any]]

T = TypeVar("T")
# How a value of an answer is read: None leaves it as it is, a text names a class below, a pair is a list or a choice.
_Spec = Any


def to_dict(value: Any) -> Any:
    """An answer as plain values again, with the names of the API; what was absent stays absent."""
    return _plain(value)


def _plain(value: Any) -> Any:
    """Plain JSON values of whatever a caller may hand over: dataclasses, mappings, sequences."""
    if dataclasses.is_dataclass(value) and not isinstance(value, type):
        names = getattr(value, "_NAMES", {})
        members = [(field, getattr(value, field.name)) for field in dataclasses.fields(value)]
        return {
            names.get(field.name, field.name): _plain(member)
            for field, member in members
            # What may be absent is; what is always there may be null.
            if member is not None or field.default is dataclasses.MISSING
        }
    if isinstance(value, Mapping):
        return {str(name): _plain(member) for name, member in value.items()}
    if isinstance(value, (list, tuple)):
        return [_plain(member) for member in value]
    return value


def _read(spec: _Spec, value: Any) -> Any:
    """Makes dataclasses of what was answered; members that this version does not know are left out."""
    if spec is None or value is None:
        return value
    if isinstance(spec, str):
        return _read_class(globals()[spec], value)
    kind, inner = spec
    if kind == "list":
        return [_read(inner, member) for member in value] if isinstance(value, list) else value
    for name in inner:
        if isinstance(value, dict) and _fits(globals()[name], value):
            return _read(name, value)
    return value


def _read_class(kind: Any, value: Any) -> Any:
    if not isinstance(value, dict):
        return value
    names, specs = kind._NAMES, kind._SPECS
    members = {}
    for field in dataclasses.fields(kind):
        members[field.name] = _read(specs.get(field.name), value.get(names.get(field.name, field.name)))
    return kind(**members)


def _fits(kind: Any, value: Mapping[str, Any]) -> bool:
    return all(name in value for name in kind._REQUIRED) and all(
        value.get(name) == fixed for name, fixed in kind._FIXED.items()
    )


def _api_name(name: str) -> str:
    """``inner_radius`` as the API spells it, ``innerRadius``; a name with a dot is left alone."""
    head, *rest = name.rstrip("_").split("_")
    return head + "".join(part[:1].upper() + part[1:] for part in rest)


class _Shape:
    """A shape of the catalogue with its dimensions."""

    SHAPE: ClassVar[str]
    _NAMES: ClassVar[Mapping[str, str]]


@dataclass(frozen=True)
class Bar(_Shape):
    """
    Rectangular bar. A straight bar or strip of rectangular section; the current enters and leaves through the
    whole end faces.
    """

    SHAPE: ClassVar[str] = "bar"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Distance between the two end faces, along the current.
    length: Quantity
    #: Width (m). Width of the section, across the current.
    width: Quantity
    #: Thickness (m). Thickness of the section; a copper foil may be given by weight, such as 1 oz/ft^2.
    thickness: Quantity


@dataclass(frozen=True)
class RoundWire(_Shape):
    """
    Round wire. A straight solid wire of circular section; the current enters and leaves through the whole end
    faces. Exactly one of diameter or radius.
    """

    SHAPE: ClassVar[str] = "round-wire"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Length of the wire between the two terminals.
    length: Quantity
    #: Diameter (m). Diameter of the bare conductor; a gauge may be given, such as AWG 24.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the bare conductor; a gauge may be given, such as AWG 24.
    radius: Optional[Quantity] = None


@dataclass(frozen=True)
class Tube(_Shape):
    """
    Round tube, axial flow. A straight round tube; the current runs along its wall and enters and leaves through
    the ring-shaped end faces. Exactly one of outer_diameter or outer_radius.
    """

    SHAPE: ClassVar[str] = "tube"
    _NAMES: ClassVar[Mapping[str, str]] = {"outer_diameter": "outerDiameter", "outer_radius": "outerRadius"}
    #: Length (m). Length of the tube between the two terminals.
    length: Quantity
    #: Wall (m). Thickness of the wall, less than half the outer diameter.
    wall: Quantity
    #: Outer diameter (m). Outer diameter of the tube.
    outer_diameter: Optional[Quantity] = None
    #: Outer radius (m). Outer radius of the tube.
    outer_radius: Optional[Quantity] = None


@dataclass(frozen=True)
class Prism(_Shape):
    """
    Prism of any section. A straight conductor of any constant section, known by its area; the current enters
    and leaves through the whole end faces.
    """

    SHAPE: ClassVar[str] = "prism"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Distance between the two end faces, along the current.
    length: Quantity
    #: Area of the section (m^2). Area of the conductor's section, such as 95 mm^2.
    area: Quantity


@dataclass(frozen=True)
class EtchedTrace(_Shape):
    """
    Etched trace. A straight board trace with the trapezoidal section that etching leaves; the current enters
    and leaves through the whole end faces.
    """

    SHAPE: ClassVar[str] = "etched-trace"
    _NAMES: ClassVar[Mapping[str, str]] = {"base_width": "baseWidth", "top_width": "topWidth"}
    #: Length (m). Distance between the two end faces, along the current.
    length: Quantity
    #: Base width (m). Width of the foot of the section, on the laminate. With an etch factor F the top is narrower by 2t/F.
    base_width: Quantity
    #: Top width (m). Width of the section at its top; it may also be the wider one (undercut).
    top_width: Quantity
    #: Thickness (m). Height of the section: foil and plating together. A foil may be given by weight, such as 1 oz/ft^2.
    thickness: Quantity


@dataclass(frozen=True)
class ViaBarrel(_Shape):
    """
    Plated hole. The plated wall of a hole through a board, or several equal holes in parallel; the current runs
    along the barrel from one side of the board to the other. Exactly one of hole_diameter or hole_radius.
    """

    SHAPE: ClassVar[str] = "via-barrel"
    _NAMES: ClassVar[Mapping[str, str]] = {"hole_diameter": "holeDiameter", "hole_radius": "holeRadius"}
    #: Height (m). Length of the barrel between the two layers that it joins; for a through hole the board's thickness.
    height: Quantity
    #: Plating (m). Thickness of the plating on the wall of the hole, outside the finished diameter.
    plating: Quantity
    #: Finished hole diameter (m). Diameter of the FINISHED hole, inside the plating. The drill is larger: drill diameter less twice the plating gives the finished hole.
    hole_diameter: Optional[Quantity] = None
    #: Finished hole radius (m). Radius of the FINISHED hole, inside the plating. The drill is larger: drill radius less twice the plating gives the finished hole.
    hole_radius: Optional[Quantity] = None
    #: Number of holes. Equal holes side by side, each carrying its share.
    count: Optional[int] = None


@dataclass(frozen=True)
class StrandedConductor(_Shape):
    """
    Stranded conductor. Equal round strands laid up into one conductor and joined at both ends; each strand is
    longer than the conductor by the lay factor. Exactly one of strand_diameter or strand_radius.
    """

    SHAPE: ClassVar[str] = "stranded-conductor"
    _NAMES: ClassVar[Mapping[str, str]] = {"strand_diameter": "strandDiameter", "strand_radius": "strandRadius", "lay_factor": "layFactor"}
    #: Length (m). Length of the finished conductor, not of a strand.
    length: Quantity
    #: Strands. Number of equal strands.
    strands: int
    #: Strand diameter (m). Diameter of the bare metal of one strand, without tin or enamel; a gauge such as AWG 24 may be given.
    strand_diameter: Optional[Quantity] = None
    #: Strand radius (m). Radius of the bare metal of one strand, without tin or enamel; a gauge such as AWG 24 may be given.
    strand_radius: Optional[Quantity] = None
    #: Lay factor. Mean length of a strand over the length of the conductor: √(1+(π/m)²) for a lay of m mean diameters, averaged over the strands.
    lay_factor: Optional[float] = None


@dataclass(frozen=True)
class ParallelPlates(_Shape):
    """
    Parallel plates. The medium that fills the gap between two parallel plates of one area; the current crosses
    from plate to plate.
    """

    SHAPE: ClassVar[str] = "parallel-plates"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Gap (m). Distance between the two plates, the thickness of the medium.
    gap: Quantity
    #: Area (m^2). Area of each plate.
    area: Quantity


@dataclass(frozen=True)
class BoxTube(_Shape):
    """
    Rectangular tube. A straight hollow bar of rectangular section with an even wall and square corners; the
    current runs along it.
    """

    SHAPE: ClassVar[str] = "box-tube"
    _NAMES: ClassVar[Mapping[str, str]] = {"outer_width": "outerWidth", "outer_height": "outerHeight"}
    #: Length (m). Distance between the two end faces, along the current.
    length: Quantity
    #: Outer width (m). Outer width of the section.
    outer_width: Quantity
    #: Outer height (m). Outer height of the section.
    outer_height: Quantity
    #: Wall (m). Thickness of the wall, the same on all four sides.
    wall: Quantity


@dataclass(frozen=True)
class CladWire(_Shape):
    """
    Clad wire. A round wire of one metal clad with another, such as copper on aluminium or on steel; both carry
    current in parallel along the wire. Exactly one of core_diameter or core_radius.
    """

    SHAPE: ClassVar[str] = "clad-wire"
    _NAMES: ClassVar[Mapping[str, str]] = {"core_diameter": "coreDiameter", "core_radius": "coreRadius", "cladding_thickness": "claddingThickness"}
    #: Length (m). Distance between the two end faces, along the current.
    length: Quantity
    #: Cladding thickness (m). Thickness of the cladding around the core, radially.
    cladding_thickness: Quantity
    #: Core diameter (m). Diameter of the core alone; the finished wire is thicker by twice the cladding.
    core_diameter: Optional[Quantity] = None
    #: Core radius (m). Radius of the core alone; the finished wire is thicker by twice the cladding.
    core_radius: Optional[Quantity] = None


@dataclass(frozen=True)
class HelicalWinding(_Shape):
    """
    Helical winding. A round wire wound into a helix with insulated turns; the current follows the wire from one
    end to the other. Exactly one of mean_diameter or mean_radius. Exactly one of wire_diameter or wire_radius.
    """

    SHAPE: ClassVar[str] = "helical-winding"
    _NAMES: ClassVar[Mapping[str, str]] = {"mean_diameter": "meanDiameter", "mean_radius": "meanRadius", "wire_diameter": "wireDiameter", "wire_radius": "wireRadius"}
    #: Turns. Number of turns; it need not be whole.
    turns: float
    #: Pitch (m). Advance along the axis per turn.
    pitch: Quantity
    #: Mean diameter (m). Diameter of the helix at the centre of the wire: former diameter plus one wire diameter.
    mean_diameter: Optional[Quantity] = None
    #: Mean radius (m). Radius of the helix at the centre of the wire: former radius plus one wire radius.
    mean_radius: Optional[Quantity] = None
    #: Wire diameter (m). Diameter of the bare metal, without enamel; a gauge such as AWG 24 may be given.
    wire_diameter: Optional[Quantity] = None
    #: Wire radius (m). Radius of the bare metal, without enamel; a gauge such as AWG 24 may be given.
    wire_radius: Optional[Quantity] = None


@dataclass(frozen=True)
class FlatSpiral(_Shape):
    """
    Flat spiral. A strip of constant width laid out as an Archimedean spiral; the current follows the strip from
    the inner end to the outer one. Exactly one of inner_radius or inner_diameter.
    """

    SHAPE: ClassVar[str] = "flat-spiral"
    _NAMES: ClassVar[Mapping[str, str]] = {"inner_radius": "innerRadius", "inner_diameter": "innerDiameter"}
    #: Turns. Number of turns; it need not be whole.
    turns: float
    #: Pitch (m). Growth of the radius per turn: width plus gap.
    pitch: Quantity
    #: Width (m). Width of the strip.
    width: Quantity
    #: Thickness (m). Thickness of the strip; a copper foil may be given by weight, such as 1 oz/ft^2.
    thickness: Quantity
    #: Inner radius (m). Radius of the centre line at the inner end: inner edge plus half the width.
    inner_radius: Optional[Quantity] = None
    #: Inner diameter (m). Diameter of the centre line at the inner end: inner edge plus half the width.
    inner_diameter: Optional[Quantity] = None


@dataclass(frozen=True)
class TaperedStrip(_Shape):
    """
    Tapered strip. A strip whose width changes evenly and symmetrically between two straight ends, through which
    the current enters and leaves.
    """

    SHAPE: ClassVar[str] = "tapered-strip"
    _NAMES: ClassVar[Mapping[str, str]] = {"start_width": "startWidth", "end_width": "endWidth"}
    #: Length (m). Distance between the two straight ends.
    length: Quantity
    #: Start width (m). Width at the high end.
    start_width: Quantity
    #: End width (m). Width at the low end.
    end_width: Quantity
    #: Thickness (m). Thickness of the strip; a copper foil may be given by weight, such as 1 oz/ft^2.
    thickness: Quantity


@dataclass(frozen=True)
class ConeFrustum(_Shape):
    """
    Conical frustum. A straight cone cut off by two flat end faces, through which the current enters and leaves;
    or a wire whose diameter changes evenly. Exactly one of start_diameter or start_radius. Exactly one of
    end_diameter or end_radius.
    """

    SHAPE: ClassVar[str] = "cone-frustum"
    _NAMES: ClassVar[Mapping[str, str]] = {"start_diameter": "startDiameter", "start_radius": "startRadius", "end_diameter": "endDiameter", "end_radius": "endRadius"}
    #: Length (m). Distance between the two flat end faces.
    length: Quantity
    #: Start diameter (m). Diameter at the high end.
    start_diameter: Optional[Quantity] = None
    #: Start radius (m). Radius at the high end.
    start_radius: Optional[Quantity] = None
    #: End diameter (m). Diameter at the low end.
    end_diameter: Optional[Quantity] = None
    #: End radius (m). Radius at the low end.
    end_radius: Optional[Quantity] = None


@dataclass(frozen=True)
class CylindricalShell(_Shape):
    """
    Cylindrical shell, radial flow. The wall between two coaxial cylinders, or a sector of it; the current runs
    radially from the inner to the outer surface. Exactly one of inner_radius or inner_diameter. Exactly one of
    outer_radius or outer_diameter or wall.
    """

    SHAPE: ClassVar[str] = "cylindrical-shell"
    _NAMES: ClassVar[Mapping[str, str]] = {"inner_radius": "innerRadius", "inner_diameter": "innerDiameter", "outer_radius": "outerRadius", "outer_diameter": "outerDiameter"}
    #: Length (m). Length along the axis.
    length: Quantity
    #: Inner radius (m). Radius of the inner surface.
    inner_radius: Optional[Quantity] = None
    #: Inner diameter (m). Diameter of the inner surface.
    inner_diameter: Optional[Quantity] = None
    #: Outer radius (m). Radius of the outer surface; or give the wall.
    outer_radius: Optional[Quantity] = None
    #: Outer diameter (m). Diameter of the outer surface; or give the wall.
    outer_diameter: Optional[Quantity] = None
    #: Wall (m). Thickness of the wall, outer less inner radius; keeps its digits however thin it is.
    wall: Optional[Quantity] = None
    #: Angle (deg). Angle of the sector around the axis; the whole shell is 360°.
    angle: Optional[Quantity] = None


@dataclass(frozen=True)
class SphericalShell(_Shape):
    """
    Spherical shell, radial flow. The wall between two concentric spheres, or the part of it inside a cone; the
    current runs radially from the inner to the outer surface. Exactly one of inner_radius or inner_diameter.
    Exactly one of outer_radius or outer_diameter or wall.
    """

    SHAPE: ClassVar[str] = "spherical-shell"
    _NAMES: ClassVar[Mapping[str, str]] = {"inner_radius": "innerRadius", "inner_diameter": "innerDiameter", "outer_radius": "outerRadius", "outer_diameter": "outerDiameter", "half_angle": "halfAngle"}
    #: Inner radius (m). Radius of the inner surface.
    inner_radius: Optional[Quantity] = None
    #: Inner diameter (m). Diameter of the inner surface.
    inner_diameter: Optional[Quantity] = None
    #: Outer radius (m). Radius of the outer surface; or give the wall.
    outer_radius: Optional[Quantity] = None
    #: Outer diameter (m). Diameter of the outer surface; or give the wall.
    outer_diameter: Optional[Quantity] = None
    #: Wall (m). Thickness of the wall, outer less inner radius; keeps its digits however thin it is.
    wall: Optional[Quantity] = None
    #: Half angle (deg). Half the opening angle of the cone that cuts the shell out: 180° the whole shell, 90° a hemisphere.
    half_angle: Optional[Quantity] = None


@dataclass(frozen=True)
class ConfocalShell(_Shape):
    """
    Confocal elliptic shell. The wall between two elliptic cylinders with common foci, such as the insulation of
    a flattened conductor; the current runs from the inner to the outer surface along hyperbolas. Exactly one of
    outer_major or wall.
    """

    SHAPE: ClassVar[str] = "confocal-shell"
    _NAMES: ClassVar[Mapping[str, str]] = {"inner_major": "innerMajor", "inner_minor": "innerMinor", "outer_major": "outerMajor"}
    #: Inner semi-major axis (m). Half the larger axis of the inner ellipse.
    inner_major: Quantity
    #: Inner semi-minor axis (m). Half the smaller axis of the inner ellipse; at most the semi-major axis.
    inner_minor: Quantity
    #: Length (m). Length along the cylinders.
    length: Quantity
    #: Outer semi-major axis (m). Half the larger axis of the outer ellipse; its smaller axis follows from the common foci. Or give the wall.
    outer_major: Optional[Quantity] = None
    #: Wall on the major axis (m). Difference of the two semi-major axes; keeps its digits however thin it is.
    wall: Optional[Quantity] = None


@dataclass(frozen=True)
class ArcBar(_Shape):
    """
    Bar bent to an arc. A bar of rectangular section bent to a circular arc; the current runs around the bend
    between the two radial end faces and crowds towards the inner edge. Exactly one of inner_radius or
    inner_diameter. Exactly one of outer_radius or outer_diameter or width.
    """

    SHAPE: ClassVar[str] = "arc-bar"
    _NAMES: ClassVar[Mapping[str, str]] = {"inner_radius": "innerRadius", "inner_diameter": "innerDiameter", "outer_radius": "outerRadius", "outer_diameter": "outerDiameter"}
    #: Thickness (m). Thickness of the bar along the axis of the bend.
    thickness: Quantity
    #: Angle (deg). Angle of the bend between the two end faces.
    angle: Quantity
    #: Inner radius (m). Radius of the inner edge of the bend.
    inner_radius: Optional[Quantity] = None
    #: Inner diameter (m). Diameter of the inner edge of the bend.
    inner_diameter: Optional[Quantity] = None
    #: Outer radius (m). Radius of the outer edge of the bend; or give the width.
    outer_radius: Optional[Quantity] = None
    #: Outer diameter (m). Diameter of the outer edge of the bend; or give the width.
    outer_diameter: Optional[Quantity] = None
    #: Width (m). Width of the bar in the plane of the bend, outer less inner radius.
    width: Optional[Quantity] = None


@dataclass(frozen=True)
class ConicalShell(_Shape):
    """
    Conical shell, radial flow. The space between two coaxial cones with a common apex, cut off by two spheres
    round the apex; the current runs away from the apex, from the inner to the outer sphere. Exactly one of
    inner_radius or inner_diameter. Exactly one of outer_radius or outer_diameter or wall.
    """

    SHAPE: ClassVar[str] = "conical-shell"
    _NAMES: ClassVar[Mapping[str, str]] = {"inner_radius": "innerRadius", "inner_diameter": "innerDiameter", "outer_radius": "outerRadius", "outer_diameter": "outerDiameter", "inner_half_angle": "innerHalfAngle", "outer_half_angle": "outerHalfAngle"}
    #: Inner half-angle (deg). Angle between the axis and the inner cone; 0 for a solid cone.
    inner_half_angle: Quantity
    #: Outer half-angle (deg). Angle between the axis and the outer cone; beyond 90° it opens backwards.
    outer_half_angle: Quantity
    #: Inner radius (m). Distance of the inner spherical face from the apex, along the cone.
    inner_radius: Optional[Quantity] = None
    #: Inner diameter (m). Distance of the inner spherical face from the apex, along the cone.
    inner_diameter: Optional[Quantity] = None
    #: Outer radius (m). Distance of the outer spherical face from the apex; or give the wall.
    outer_radius: Optional[Quantity] = None
    #: Outer diameter (m). Distance of the outer spherical face from the apex; or give the wall.
    outer_diameter: Optional[Quantity] = None
    #: Wall (m). Length along the cone, outer less inner radius; keeps its digits however short it is.
    wall: Optional[Quantity] = None


@dataclass(frozen=True)
class BentTube(_Shape):
    """
    Bent tube. A round tube bent to an arc of a circle; the current enters and leaves through the cut end faces
    and runs round the bend. Exactly one of bend_radius or bend_diameter. Exactly one of outer_diameter or
    outer_radius.
    """

    SHAPE: ClassVar[str] = "bent-tube"
    _NAMES: ClassVar[Mapping[str, str]] = {"bend_radius": "bendRadius", "bend_diameter": "bendDiameter", "outer_diameter": "outerDiameter", "outer_radius": "outerRadius"}
    #: Wall (m). Thickness of the wall; less than half the outer diameter.
    wall: Quantity
    #: Bend angle (deg). Angle of the bend between its two end faces.
    angle: Quantity
    #: Bend radius (m). Radius of the centre line of the tube; greater than half the outer diameter.
    bend_radius: Optional[Quantity] = None
    #: Bend diameter (m). Diameter of the centre line of the tube; greater than half the outer diameter.
    bend_diameter: Optional[Quantity] = None
    #: Outer diameter (m). Outer diameter of the tube.
    outer_diameter: Optional[Quantity] = None
    #: Outer radius (m). Outer radius of the tube.
    outer_radius: Optional[Quantity] = None


@dataclass(frozen=True)
class HyperbolicNeck(_Shape):
    """
    Hyperbolic neck. A body whose wall is a hyperboloid round the axis, narrowest at the throat; the current
    runs along the axis between caps that are oblate spheroids confocal with the wall. Exactly one of
    throat_radius or throat_diameter.
    """

    SHAPE: ClassVar[str] = "hyperbolic-neck"
    _NAMES: ClassVar[Mapping[str, str]] = {"throat_radius": "throatRadius", "throat_diameter": "throatDiameter", "opening_angle": "openingAngle"}
    #: Opening angle (deg). Angle between the axis and the cone that the wall approaches; 90° is a hole in a thin insulating plane.
    opening_angle: Quantity
    #: Length of one side (m). Distance on the axis from the throat to the cap, one side.
    length: Quantity
    #: Throat radius (m). Radius at the narrowest place.
    throat_radius: Optional[Quantity] = None
    #: Throat diameter (m). Diameter at the narrowest place.
    throat_diameter: Optional[Quantity] = None
    #: Sides. 2: the neck widens on both sides of the throat; 1: the throat is a terminal.
    sides: Optional[int] = None


@dataclass(frozen=True)
class TorusArc(_Shape):
    """
    Bent round bar. A round bar bent to an arc of a circle, a part of a torus; the current enters and leaves
    through the cut end faces and runs round the bend. Exactly one of bend_radius or bend_diameter. Exactly one
    of diameter or radius.
    """

    SHAPE: ClassVar[str] = "torus-arc"
    _NAMES: ClassVar[Mapping[str, str]] = {"bend_radius": "bendRadius", "bend_diameter": "bendDiameter"}
    #: Bend angle (deg). Angle of the bend between its two end faces.
    angle: Quantity
    #: Bend radius (m). Radius of the centre line of the bar; greater than half its diameter.
    bend_radius: Optional[Quantity] = None
    #: Bend diameter (m). Diameter of the centre line of the bar; greater than half its diameter.
    bend_diameter: Optional[Quantity] = None
    #: Diameter (m). Diameter of the bar.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the bar.
    radius: Optional[Quantity] = None


@dataclass(frozen=True)
class CylinderInSquare(_Shape):
    """
    Cylinder in a square duct. A round cylinder in the middle of a square duct, such as a conductor cast in a
    square block; the current runs from the cylinder to the four sides. Exactly one of diameter or radius.
    """

    SHAPE: ClassVar[str] = "cylinder-in-square"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Side (m). Inside width of the square duct.
    side: Quantity
    #: Length (m). Length along the axis.
    length: Quantity
    #: Diameter (m). Diameter of the cylinder; less than the side.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the cylinder; less than the side.
    radius: Optional[Quantity] = None


@dataclass(frozen=True)
class EccentricCylinders(_Shape):
    """
    Eccentric cylinders. The space between two cylinders with parallel axes, one inside the other and out of
    centre, such as the insulation of an off-centre core; the current runs from the inner to the outer one.
    Exactly one of inner_diameter or inner_radius. Exactly one of outer_diameter or outer_radius. Exactly one of
    offset or gap.
    """

    SHAPE: ClassVar[str] = "eccentric-cylinders"
    _NAMES: ClassVar[Mapping[str, str]] = {"inner_diameter": "innerDiameter", "inner_radius": "innerRadius", "outer_diameter": "outerDiameter", "outer_radius": "outerRadius"}
    #: Length (m). Length along the axes.
    length: Quantity
    #: Inner diameter (m). Diameter of the inner cylinder.
    inner_diameter: Optional[Quantity] = None
    #: Inner radius (m). Radius of the inner cylinder.
    inner_radius: Optional[Quantity] = None
    #: Outer diameter (m). Inside diameter of the outer cylinder.
    outer_diameter: Optional[Quantity] = None
    #: Outer radius (m). Inside radius of the outer cylinder.
    outer_radius: Optional[Quantity] = None
    #: Offset (m). Distance between the two axes; 0 is concentric.
    offset: Optional[Quantity] = None
    #: Smallest gap (m). Smallest distance between the two surfaces; keeps its digits however small it is.
    gap: Optional[Quantity] = None


@dataclass(frozen=True)
class ParallelCylinders(_Shape):
    """
    Parallel cylinders. Two long cylinders beside each other in a medium that reaches far on all sides; the
    current runs from one to the other. Exactly one of diameter1 or radius1. Exactly one of diameter2 or
    radius2. Exactly one of spacing or gap.
    """

    SHAPE: ClassVar[str] = "parallel-cylinders"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Length along the axes.
    length: Quantity
    #: First diameter (m). Diameter of the first cylinder.
    diameter1: Optional[Quantity] = None
    #: First radius (m). Radius of the first cylinder.
    radius1: Optional[Quantity] = None
    #: Second diameter (m). Diameter of the second cylinder.
    diameter2: Optional[Quantity] = None
    #: Second radius (m). Radius of the second cylinder.
    radius2: Optional[Quantity] = None
    #: Spacing (m). Distance between the two axes.
    spacing: Optional[Quantity] = None
    #: Gap (m). Smallest distance between the two surfaces; keeps its digits however small it is.
    gap: Optional[Quantity] = None


@dataclass(frozen=True)
class CylinderPlane(_Shape):
    """
    Cylinder and plane. A long cylinder parallel to a plane electrode, in a medium that fills the space on its
    side; the current runs from the cylinder to the plane. Exactly one of diameter or radius. Exactly one of
    height or gap.
    """

    SHAPE: ClassVar[str] = "cylinder-plane"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Length along the axis.
    length: Quantity
    #: Diameter (m). Diameter of the cylinder.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the cylinder.
    radius: Optional[Quantity] = None
    #: Height (m). Distance from the axis to the plane.
    height: Optional[Quantity] = None
    #: Gap (m). Smallest distance between the surface and the plane; keeps its digits however small it is.
    gap: Optional[Quantity] = None


@dataclass(frozen=True)
class SpherePlane(_Shape):
    """
    Sphere and plane. A sphere above a plane electrode, in a medium that fills the space on its side; the
    current runs from the sphere to the plane. Exactly one of diameter or radius. Exactly one of height or gap.
    """

    SHAPE: ClassVar[str] = "sphere-plane"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Diameter (m). Diameter of the sphere.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the sphere.
    radius: Optional[Quantity] = None
    #: Height (m). Distance from the centre to the plane.
    height: Optional[Quantity] = None
    #: Gap (m). Smallest distance between the surface and the plane; keeps its digits however small it is.
    gap: Optional[Quantity] = None


@dataclass(frozen=True)
class SphereBuried(_Shape):
    """
    Buried sphere. A sphere below the insulating surface of a half-space, such as an electrode in the ground or
    under water; the current spreads from it to infinity. Exactly one of diameter or radius. Exactly one of
    depth or cover.
    """

    SHAPE: ClassVar[str] = "sphere-buried"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Diameter (m). Diameter of the sphere.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the sphere.
    radius: Optional[Quantity] = None
    #: Depth (m). Distance from the surface down to the centre.
    depth: Optional[Quantity] = None
    #: Cover (m). Thickness of the medium above the sphere; keeps its digits however small it is.
    cover: Optional[Quantity] = None


@dataclass(frozen=True)
class SpherePair(_Shape):
    """
    Two spheres. Two spheres in a medium that reaches far on all sides; the current runs from one to the other,
    and none to infinity. Exactly one of diameter1 or radius1. Exactly one of diameter2 or radius2. Exactly one
    of spacing or gap.
    """

    SHAPE: ClassVar[str] = "sphere-pair"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: First diameter (m). Diameter of the first sphere.
    diameter1: Optional[Quantity] = None
    #: First radius (m). Radius of the first sphere.
    radius1: Optional[Quantity] = None
    #: Second diameter (m). Diameter of the second sphere.
    diameter2: Optional[Quantity] = None
    #: Second radius (m). Radius of the second sphere.
    radius2: Optional[Quantity] = None
    #: Spacing (m). Distance between the two centres.
    spacing: Optional[Quantity] = None
    #: Gap (m). Smallest distance between the two surfaces; keeps its digits however small it is.
    gap: Optional[Quantity] = None


@dataclass(frozen=True)
class Spheroid(_Shape):
    """
    Spheroid. An ellipsoid of revolution, slender or flat, in a medium without bounds, or half of it below an
    insulating plane through its centre; the current spreads from it to infinity. Exactly one of polar_diameter
    or polar_radius. Exactly one of equatorial_diameter or equatorial_radius.
    """

    SHAPE: ClassVar[str] = "spheroid"
    _NAMES: ClassVar[Mapping[str, str]] = {"polar_diameter": "polarDiameter", "polar_radius": "polarRadius", "equatorial_diameter": "equatorialDiameter", "equatorial_radius": "equatorialRadius"}
    #: Polar diameter (m). Length along the axis of revolution.
    polar_diameter: Optional[Quantity] = None
    #: Polar radius (m). Length along the axis of revolution.
    polar_radius: Optional[Quantity] = None
    #: Equatorial diameter (m). Diameter across the axis of revolution.
    equatorial_diameter: Optional[Quantity] = None
    #: Equatorial radius (m). Radius across the axis of revolution.
    equatorial_radius: Optional[Quantity] = None
    #: Space ("full", "half"). full: medium on all sides; half: an insulating plane through the centre, such as the ground surface.
    space: Optional[str] = None


@dataclass(frozen=True)
class ContactSpot(_Shape):
    """
    Round contact spot. A round spot through which two large bodies touch, or a round electrode on one; the
    current narrows to the spot and spreads again. Exactly one of spot_diameter or spot_radius.
    """

    SHAPE: ClassVar[str] = "contact-spot"
    _NAMES: ClassVar[Mapping[str, str]] = {"spot_diameter": "spotDiameter", "spot_radius": "spotRadius"}
    #: Spot diameter (m). Diameter of the conducting spot.
    spot_diameter: Optional[Quantity] = None
    #: Spot radius (m). Radius of the conducting spot.
    spot_radius: Optional[Quantity] = None
    #: Sides. 2: bodies on both sides of the spot; 1: an electrode on one body.
    sides: Optional[int] = None


@dataclass(frozen=True)
class EllipticContactSpot(_Shape):
    """
    Elliptic contact spot. An elliptic spot through which two large bodies touch, such as crossed or grooved
    cylinders pressed together; the current narrows to the spot and spreads again. Exactly one of major_diameter
    or major_radius. Exactly one of minor_diameter or minor_radius.
    """

    SHAPE: ClassVar[str] = "elliptic-contact-spot"
    _NAMES: ClassVar[Mapping[str, str]] = {"major_diameter": "majorDiameter", "major_radius": "majorRadius", "minor_diameter": "minorDiameter", "minor_radius": "minorRadius"}
    #: Major diameter (m). Longer axis of the conducting ellipse.
    major_diameter: Optional[Quantity] = None
    #: Major radius (m). Longer axis of the conducting ellipse.
    major_radius: Optional[Quantity] = None
    #: Minor diameter (m). Shorter axis; at most the longer one.
    minor_diameter: Optional[Quantity] = None
    #: Minor radius (m). Shorter axis; at most the longer one.
    minor_radius: Optional[Quantity] = None
    #: Sides. 2: bodies on both sides of the spot; 1: an electrode on one body.
    sides: Optional[int] = None


@dataclass(frozen=True)
class SpotInCylinder(_Shape):
    """
    Contact spot in a cylinder. A round spot in the middle of the end faces through which two equal round bars
    touch; the resistance is what the narrowing to the spot adds to the bars' own. Exactly one of spot_diameter
    or spot_radius. Exactly one of cylinder_diameter or cylinder_radius.
    """

    SHAPE: ClassVar[str] = "spot-in-cylinder"
    _NAMES: ClassVar[Mapping[str, str]] = {"spot_diameter": "spotDiameter", "spot_radius": "spotRadius", "cylinder_diameter": "cylinderDiameter", "cylinder_radius": "cylinderRadius"}
    #: Spot diameter (m). Diameter of the conducting spot; less than that of the bar.
    spot_diameter: Optional[Quantity] = None
    #: Spot radius (m). Radius of the conducting spot; less than that of the bar.
    spot_radius: Optional[Quantity] = None
    #: Bar diameter (m). Diameter of the round bar.
    cylinder_diameter: Optional[Quantity] = None
    #: Bar radius (m). Radius of the round bar.
    cylinder_radius: Optional[Quantity] = None
    #: Sides. 2: bars on both sides of the spot; 1: an electrode on the end of one bar.
    sides: Optional[int] = None


@dataclass(frozen=True)
class SheetStrip(_Shape):
    """Sheet strip. A straight strip of a thin sheet; the current enters and leaves across its whole ends."""

    SHAPE: ClassVar[str] = "sheet-strip"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Distance between the two ends.
    length: Quantity
    #: Width (m). Width of the strip.
    width: Quantity


@dataclass(frozen=True)
class SheetBend(_Shape):
    """
    Right-angle bend. Two strips of a thin sheet that meet at a right angle with a full corner; the current
    enters across the end of one leg and leaves across the end of the other.
    """

    SHAPE: ClassVar[str] = "sheet-bend"
    _NAMES: ClassVar[Mapping[str, str]] = {"leg_length1": "legLength1", "leg_length2": "legLength2"}
    #: First leg (m). Length of the first leg from the inner corner, corner excluded.
    leg_length1: Quantity
    #: Second leg (m). Length of the second leg from the inner corner, corner excluded.
    leg_length2: Quantity
    #: First width (m). Width of the first leg.
    width1: Quantity
    #: Second width (m). Width of the second leg.
    width2: Quantity


@dataclass(frozen=True)
class SheetStep(_Shape):
    """
    Step in width. A strip of a thin sheet that changes its width abruptly, on one side or on both; the current
    runs along it between its two whole ends.
    """

    SHAPE: ClassVar[str] = "sheet-step"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: First length (m). Length of the first part, from its end to the step.
    length1: Quantity
    #: First width (m). Width of the first part.
    width1: Quantity
    #: Second length (m). Length of the second part, from the step to its end.
    length2: Quantity
    #: Second width (m). Width of the second part.
    width2: Quantity
    #: Alignment ("edge", "centre"). edge: the step is on one side; centre: half of it on each side.
    alignment: str


@dataclass(frozen=True)
class SheetMeander(_Shape):
    """
    Meander. A strip of thin sheet folded into parallel legs with square turns, such as a film resistor or a
    heater; the current enters across the free end of the first leg and leaves across that of the last.
    """

    SHAPE: ClassVar[str] = "sheet-meander"
    _NAMES: ClassVar[Mapping[str, str]] = {"leg_length": "legLength"}
    #: Legs. Number of parallel legs.
    legs: int
    #: Leg length (m). Length of each leg between the corners, corners excluded; the first and last from their free end to the corner.
    leg_length: Quantity
    #: Width (m). Width of the strip, in legs and turns.
    width: Quantity
    #: Gap (m). Clear distance between neighbouring legs.
    gap: Quantity


@dataclass(frozen=True)
class SheetEndTerminal(_Shape):
    """
    Sheet with a partial end terminal. A rectangular sheet with one whole end as a terminal and the other end
    covered in part only, in its middle or from one edge on; the current crowds towards the partial terminal.
    """

    SHAPE: ClassVar[str] = "sheet-end-terminal"
    _NAMES: ClassVar[Mapping[str, str]] = {"terminal_width": "terminalWidth"}
    #: Length (m). Distance between the two ends.
    length: Quantity
    #: Width (m). Width of the sheet.
    width: Quantity
    #: Terminal width (m). Width of the partial terminal; at most that of the sheet.
    terminal_width: Quantity
    #: Position ("centre", "edge"). Where the partial terminal lies on its end.
    position: str


@dataclass(frozen=True)
class SheetTee(_Shape):
    """
    T junction. A straight bar of thin sheet with a stub at a right angle; the current runs through the bar,
    from its left arm into the stub, or from both arms together into the stub.
    """

    SHAPE: ClassVar[str] = "sheet-tee"
    _NAMES: ClassVar[Mapping[str, str]] = {"bar_width": "barWidth", "stub_width": "stubWidth", "left_length": "leftLength", "right_length": "rightLength", "stub_length": "stubLength"}
    #: Bar width (m). Width of the bar that runs straight through.
    bar_width: Quantity
    #: Stub width (m). Width of the stub.
    stub_width: Quantity
    #: Left arm (m). Length of the bar's left arm, from the inner corner to its end.
    left_length: Quantity
    #: Right arm (m). Length of the bar's right arm, from the inner corner to its end.
    right_length: Quantity
    #: Stub (m). Length of the stub, from the inner corners to its end.
    stub_length: Quantity
    #: Path ("through", "branch", "both"). Which ends are terminals; the end of a floating arm is an insulated edge.
    path: str


@dataclass(frozen=True)
class SheetSlit(_Shape):
    """
    Strip with a slit. A strip of thin sheet with a thin insulating cut across it at mid-length, such as a laser
    trim: from one edge, inside, or from both edges; the current runs along the strip through what is left.
    """

    SHAPE: ClassVar[str] = "sheet-slit"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Distance between the two ends of the strip.
    length: Quantity
    #: Width (m). Width of the strip.
    width: Quantity
    #: Opening (m). Total width that is left uncut at the slit; at most that of the strip.
    opening: Quantity
    #: Kind ("edge", "centre", "iris"). centre leaves half of the opening at each edge, iris all of it in the middle; both have the same resistance.
    kind: str


@dataclass(frozen=True)
class SheetDisc(_Shape):
    """
    Round sheet with rim terminals. A round thin sheet with two terminals along its rim, centred opposite each
    other; the current runs across the disc from one arc to the other. Exactly one of diameter or radius.
    """

    SHAPE: ClassVar[str] = "sheet-disc"
    _NAMES: ClassVar[Mapping[str, str]] = {"terminal_angle1": "terminalAngle1", "terminal_angle2": "terminalAngle2"}
    #: First terminal (deg). Angle at the centre that the first terminal spans.
    terminal_angle1: Quantity
    #: Second terminal (deg). Angle at the centre that the second terminal spans.
    terminal_angle2: Quantity
    #: Diameter (m). Diameter of the disc; the resistance does not depend on it.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the disc; the resistance does not depend on it.
    radius: Optional[Quantity] = None


@dataclass(frozen=True)
class EarthHemisphere(_Shape):
    """
    Hemisphere in the ground. A metal hemisphere with its flat side flush with the ground; the current spreads
    radially into the soil. The model for a compact electrode. Exactly one of diameter or radius.
    """

    SHAPE: ClassVar[str] = "earth-hemisphere"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Diameter (m). Diameter of the hemisphere at the surface.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the hemisphere at the surface.
    radius: Optional[Quantity] = None


@dataclass(frozen=True)
class EarthRod(_Shape):
    """
    Earth rod. A round metal rod driven straight down from the surface; the current spreads into the soil along
    its whole length. Exactly one of diameter or radius.
    """

    SHAPE: ClassVar[str] = "earth-rod"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Length of the rod in the soil.
    length: Quantity
    #: Diameter (m). Diameter of the rod, or of its conductive backfill.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the rod, or of its conductive backfill.
    radius: Optional[Quantity] = None


@dataclass(frozen=True)
class EarthRodPair(_Shape):
    """
    Two earth rods. Two equal rods driven from the surface and joined together, taken as one terminal; valid for
    every spacing. Exactly one of diameter or radius.
    """

    SHAPE: ClassVar[str] = "earth-rod-pair"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Length of each rod in the soil.
    length: Quantity
    #: Spacing (m). Distance between the axes of the two rods.
    spacing: Quantity
    #: Diameter (m). Diameter of each rod.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of each rod.
    radius: Optional[Quantity] = None


@dataclass(frozen=True)
class EarthRodGroup(_Shape):
    """
    Group of earth rods. Equal rods driven from the surface in a line, a ring or a square grid and joined
    together, taken as one terminal. Exactly one of diameter or radius.
    """

    SHAPE: ClassVar[str] = "earth-rod-group"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Length of each rod in the soil.
    length: Quantity
    #: Spacing (m). Distance between the axes of neighbouring rods; in a ring straight across, not along the circle.
    spacing: Quantity
    #: Number of rods. How many rods; for a square grid a square number such as 4, 9 or 16.
    count: int
    #: Diameter (m). Diameter of each rod.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of each rod.
    radius: Optional[Quantity] = None
    #: Arrangement ("line", "ring", "square"). How the rods stand: in a straight line, evenly on a ring, or in a square grid of equal rows.
    arrangement: Optional[str] = None


@dataclass(frozen=True)
class EarthWire(_Shape):
    """
    Buried wire. A straight bare wire laid horizontally in the ground; the current spreads into the soil along
    it. Exactly one of diameter or radius.
    """

    SHAPE: ClassVar[str] = "earth-wire"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Length (m). Whole length of the wire, from end to end.
    length: Quantity
    #: Depth (m). Depth of the wire's axis below the surface.
    depth: Quantity
    #: Wire diameter (m). Diameter of the wire; for a strip take half its width.
    diameter: Optional[Quantity] = None
    #: Wire radius (m). Radius of the wire; for a strip take half its width.
    radius: Optional[Quantity] = None


@dataclass(frozen=True)
class EarthRing(_Shape):
    """
    Buried ring. A closed ring of bare round wire laid horizontally in the ground, such as a foundation's ring
    electrode. Exactly one of ring_diameter or ring_radius. Exactly one of wire_diameter or wire_radius.
    """

    SHAPE: ClassVar[str] = "earth-ring"
    _NAMES: ClassVar[Mapping[str, str]] = {"ring_diameter": "ringDiameter", "ring_radius": "ringRadius", "wire_diameter": "wireDiameter", "wire_radius": "wireRadius"}
    #: Depth (m). Depth of the ring below the surface, to the centre of the wire.
    depth: Quantity
    #: Ring diameter (m). Diameter of the ring at the centre of the wire.
    ring_diameter: Optional[Quantity] = None
    #: Ring radius (m). Radius of the ring at the centre of the wire.
    ring_radius: Optional[Quantity] = None
    #: Wire diameter (m). Diameter of the wire; for a strip take half its width.
    wire_diameter: Optional[Quantity] = None
    #: Wire radius (m). Radius of the wire; for a strip take half its width.
    wire_radius: Optional[Quantity] = None


@dataclass(frozen=True)
class EarthPlate(_Shape):
    """
    Buried plate. A thin round metal plate laid flat in the ground with both faces in the soil; the current
    leaves from both, mostly near the rim. Exactly one of diameter or radius.
    """

    SHAPE: ClassVar[str] = "earth-plate"
    _NAMES: ClassVar[Mapping[str, str]] = {}
    #: Depth (m). Depth of the plate below the surface.
    depth: Quantity
    #: Diameter (m). Diameter of the plate; a square plate acts like a round one of the same area to about 2 %.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the plate; a square plate acts like a round one of the same area to about 2 %.
    radius: Optional[Quantity] = None


@dataclass(frozen=True)
class EarthStar(_Shape):
    """
    Buried star. Equal straight bare wires laid horizontally in the ground from one common point; two arms stand
    at a right angle, more are spread evenly. Exactly one of wire_diameter or wire_radius.
    """

    SHAPE: ClassVar[str] = "earth-star"
    _NAMES: ClassVar[Mapping[str, str]] = {"arm_length": "armLength", "wire_diameter": "wireDiameter", "wire_radius": "wireRadius"}
    #: Arms. Number of arms: 2 (at a right angle), 3, 4, 6 or 8.
    arms: int
    #: Arm length (m). Length of each arm from the common point.
    arm_length: Quantity
    #: Depth (m). Depth of the wires' axes below the surface.
    depth: Quantity
    #: Wire diameter (m). Diameter of the wire; for a strip take half its width.
    wire_diameter: Optional[Quantity] = None
    #: Wire radius (m). Radius of the wire; for a strip take half its width.
    wire_radius: Optional[Quantity] = None


@dataclass(frozen=True)
class EarthRodLayered(_Shape):
    """
    Earth rod in two layers. A round rod driven from the surface of a soil of two horizontal layers; it may end
    in the upper layer or reach into the lower one. Exactly one of diameter or radius.
    """

    SHAPE: ClassVar[str] = "earth-rod-layered"
    _NAMES: ClassVar[Mapping[str, str]] = {"upper_depth": "upperDepth"}
    #: Length (m). Length of the rod in the soil.
    length: Quantity
    #: Depth of the upper layer (m). Thickness of the upper layer, from the surface down.
    upper_depth: Quantity
    #: Diameter (m). Diameter of the rod, or of its conductive backfill.
    diameter: Optional[Quantity] = None
    #: Radius (m). Radius of the rod, or of its conductive backfill.
    radius: Optional[Quantity] = None


@dataclass(frozen=True)
class EarthGrid(_Shape):
    """
    Earth grid. A horizontal grid of bare conductors under a site, joined where they cross; estimated from its
    area, its depth and the length of its conductors.
    """

    SHAPE: ClassVar[str] = "earth-grid"
    _NAMES: ClassVar[Mapping[str, str]] = {"conductor_length": "conductorLength"}
    #: Area (m^2). Area that the grid encloses.
    area: Quantity
    #: Conductor length (m). Total length of buried bare conductors; for a rectangle of m by n meshes (m+1) lengths and (n+1) widths.
    conductor_length: Quantity
    #: Depth (m). Depth of the grid below the surface.
    depth: Quantity


@dataclass(frozen=True)
class ShapeDimensionRange:
    """Admitted values, in `unit`; null for a choice."""

    _NAMES: ClassVar[Mapping[str, str]] = {"exclusive_min": "exclusiveMin"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("min", "exclusiveMin", "max")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    min: float
    #: Whether `min` itself is excluded.
    exclusive_min: bool
    max: Optional[float]


@dataclass(frozen=True)
class ShapeDimensionChoice:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "label")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    value: str
    label: str


@dataclass(frozen=True)
class ShapeDimension:
    """A dimension as a request may give it."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"range": "ShapeDimensionRange", "choices": ("list", "ShapeDimensionChoice")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("name", "label", "symbol", "type", "unit", "required", "default", "range", "choices", "help")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    name: str
    label: str
    symbol: str
    type: str
    #: Unit of a bare number: m, m^2, deg or 1; null for a choice.
    unit: Optional[str]
    #: Whether it, or another of its alternatives, must be given.
    required: bool
    #: Value when left out, in `unit`.
    default: Optional[Union[float, str]]
    #: Admitted values, in `unit`; null for a choice.
    range: Optional[ShapeDimensionRange]
    choices: Optional[List[ShapeDimensionChoice]]
    help: str


@dataclass(frozen=True)
class ShapeCoordinate:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("name", "role", "unit", "label", "start", "end")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    name: str
    role: str
    unit: str
    label: str
    start: str
    end: str


@dataclass(frozen=True)
class ShapeMediaName:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("name", "label")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    name: str
    label: str


@dataclass(frozen=True)
class ShapeMedia:
    """What the shape is filled with: `medium` (bulk or sheet), or `media` by these names."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"names": ("list", "ShapeMediaName")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("kind", "names", "gradable")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    kind: str
    names: List[ShapeMediaName]
    #: Coordinates along which the medium may vary.
    gradable: List[str]


@dataclass(frozen=True)
class ShapeTerminals:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("high", "low")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    high: str
    low: str


@dataclass(frozen=True)
class ShapeConstraint:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("dimensions", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    dimensions: List[str]
    text: str


@dataclass(frozen=True)
class ShapeSource:
    """Where a law or a number comes from."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("title", "provenance")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    title: str
    provenance: str
    detail: Optional[str] = None


@dataclass(frozen=True)
class Shape:
    """One entry of the catalogue."""

    _NAMES: ClassVar[Mapping[str, str]] = {"bounds_basis": "boundsBasis"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"dimensions": ("list", "ShapeDimension"), "coordinates": ("list", "ShapeCoordinate"), "media": "ShapeMedia", "terminals": "ShapeTerminals", "constraints": ("list", "ShapeConstraint"), "sources": ("list", "ShapeSource")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "title", "family", "summary", "dimensions", "alternatives", "coordinates", "media", "terminals", "constraints", "formula", "boundsBasis", "validity", "cautions", "assumptions", "sources", "example")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    title: str
    #: Family of shapes.
    family: str
    summary: str
    dimensions: List[ShapeDimension]
    #: Groups of dimensions of which exactly one is given.
    alternatives: List[List[str]]
    coordinates: List[ShapeCoordinate]
    #: What the shape is filled with: `medium` (bulk or sheet), or `media` by these names.
    media: ShapeMedia
    terminals: ShapeTerminals
    constraints: List[ShapeConstraint]
    #: TeX of the law for a uniform medium.
    formula: str
    #: Where the bounds come from: rounding (closed form or converged series), quadrature (error estimate), rayleigh (conducting sheets and insulating walls), formula-accuracy (stated accuracy of a published formula), energy (two field solutions), energy-quadrature (the same with estimated integrals).
    bounds_basis: str
    validity: List[str]
    cautions: List[str]
    assumptions: List[str]
    sources: List[ShapeSource]
    #: A request body that works.
    example: Dict[str, Any]


@dataclass(frozen=True)
class Catalogue:
    """The whole catalogue."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"items": ("list", "Shape")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("items", "next")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    items: List[Shape]
    #: Cursor of the next page; null on the last one.
    next: Optional[str]


@dataclass(frozen=True)
class BoundedResistance:
    """A resistance with its bounds."""

    _NAMES: ClassVar[Mapping[str, str]] = {"bounds_basis": "boundsBasis"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text", "lower", "upper", "boundsBasis", "proved")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "ohm"}
    #: Resistance in ohms; lower ≤ value ≤ upper.
    value: float
    unit: str
    #: The value for people, rounded as its bounds allow.
    text: str
    #: Lower bound in ohms, below the upper one always.
    lower: float
    #: Upper bound in ohms.
    upper: float
    #: Where the bounds come from: rounding (closed form or converged series), quadrature (error estimate), rayleigh (conducting sheets and insulating walls), formula-accuracy (stated accuracy of a published formula), energy (two field solutions), energy-quadrature (the same with estimated integrals).
    bounds_basis: str
    #: Whether the bounds are proved for the stated problem.
    proved: bool


@dataclass(frozen=True)
class AnsweredResistanceConductance:
    """The reciprocal of the resistance."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "siemens"}
    #: Conductance in siemens.
    value: float
    unit: str
    #: The value for people.
    text: str


@dataclass(frozen=True)
class AnsweredResistanceOperating:
    """The operating point; voltage, current and power only where the request gave one of them."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("temperature",)
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Temperature in °C at which the medium was evaluated.
    temperature: float
    #: Voltage across the terminals in volts.
    voltage: Optional[float] = None
    #: Current in amperes.
    current: Optional[float] = None
    #: Power in watts.
    power: Optional[float] = None


@dataclass(frozen=True)
class AnsweredResistanceQuadrature:
    """How the integral went; only where the method is quadrature."""

    _NAMES: ClassVar[Mapping[str, str]] = {"relative_error": "relativeError"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("status", "evaluations", "relativeError")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    status: str
    evaluations: int
    #: Estimated relative error of the integral.
    relative_error: float


@dataclass(frozen=True)
class UncertaintyContribution:
    """What one input contributes."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("input", "sensitivity", "standard", "share")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Place of the input in the request, such as `dimensions.innerRadius`; a material stands for its stated uncertainty.
    input: str
    #: Derivative of the resistance by the input at the nominal values, in ohms per SI unit (per radian, per kelvin; for a material per unit of the ratio of true to nominal resistivity).
    sensitivity: float
    #: Standard uncertainty of the input in SI (rad, K; a ratio for a material).
    standard: float
    #: Part of the whole that is due to this input, 0 … 1: of the variance, or for `worst-case` of the ranges that the inputs span one at a time.
    share: float


@dataclass(frozen=True)
class Uncertainty:
    """How far the resistance strays with the tolerances of the inputs; bounds are a separate statement."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"contributions": ("list", "UncertaintyContribution")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("method", "standard", "low", "high", "coverage", "text", "basis", "contributions")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    method: str
    #: Standard uncertainty of the resistance in ohms; for `worst-case` that of first-order propagation.
    standard: float
    #: Lower end of the range in ohms.
    low: float
    #: Upper end of the range in ohms.
    high: float
    #: Probability that the range covers the resistance: 0.95; 1 for `worst-case`, whose range is the whole box.
    coverage: float
    #: The range for people, rounded by JCGM 100, 7.2.6.
    text: str
    #: How the range was found, in one or two sentences.
    basis: str
    #: The budget, largest share first.
    contributions: List[UncertaintyContribution]
    #: Mean of the trials in ohms; `monte-carlo` only.
    mean: Optional[float] = None
    #: Trials made; `monte-carlo` only.
    trials: Optional[int] = None
    #: Seed used; `monte-carlo` only.
    seed: Optional[int] = None


@dataclass(frozen=True)
class AnsweredResistancePeakField:
    """Largest field strength"""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "V/m"}
    #: Largest field strength; null where it is unbounded or not known.
    value: Optional[float]
    unit: str
    text: str


@dataclass(frozen=True)
class AnsweredResistancePeakCurrentDensity:
    """Largest current density"""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "A/m^2"}
    #: Largest current density; null where it is unbounded or not known.
    value: Optional[float]
    unit: str
    text: str


@dataclass(frozen=True)
class AnsweredResistancePeakCurrentDensity2:
    """Largest sheet current density"""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "A/m"}
    #: Largest sheet current density; null where it is unbounded or not known.
    value: Optional[float]
    unit: str
    text: str


@dataclass(frozen=True)
class AnsweredResistancePeakPosition:
    """Where the field is largest."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("coordinate", "value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Coordinate of the shape, or null where it has none.
    coordinate: Optional[str]
    #: Value of that coordinate, m or rad.
    value: Optional[float]
    unit: Optional[str]
    #: The place in words.
    text: str


@dataclass(frozen=True)
class AnsweredResistancePeakCurrentDensityPosition:
    """Where the current density is largest."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("coordinate", "value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Coordinate of the shape, or null where it has none.
    coordinate: Optional[str]
    #: Value of that coordinate, m or rad.
    value: Optional[float]
    unit: Optional[str]
    #: The place in words.
    text: str


@dataclass(frozen=True)
class AnsweredResistancePeak:
    """Where the field and the current density are largest."""

    _NAMES: ClassVar[Mapping[str, str]] = {"current_density": "currentDensity", "current_density_position": "currentDensityPosition"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"field": "AnsweredResistancePeakField", "current_density": ("any", ("AnsweredResistancePeakCurrentDensity", "AnsweredResistancePeakCurrentDensity2",)), "position": "AnsweredResistancePeakPosition", "current_density_position": "AnsweredResistancePeakCurrentDensityPosition"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("field", "currentDensity", "position", "currentDensityPosition", "per")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Largest field strength
    field: AnsweredResistancePeakField
    current_density: Union[AnsweredResistancePeakCurrentDensity, AnsweredResistancePeakCurrentDensity2]
    #: Where the field is largest.
    position: AnsweredResistancePeakPosition
    #: Where the current density is largest.
    current_density_position: AnsweredResistancePeakCurrentDensityPosition
    #: Whether the values hold at the operating point or at one volt.
    per: str


@dataclass(frozen=True)
class AnsweredResistanceStep:
    """One step of how the number came about."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("title", "tex")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    title: str
    #: The step as TeX.
    tex: str
    #: Its outcome for people.
    value: Optional[str] = None


@dataclass(frozen=True)
class AnsweredResistanceProfileAcross:
    """For a medium graded across the flow."""

    _NAMES: ClassVar[Mapping[str, str]] = {"current_density": "currentDensity"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("coordinate", "unit", "position", "conductivity", "currentDensity")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    coordinate: str
    unit: str
    #: Values of the coordinate across the flow, m or rad.
    position: List[float]
    #: Conductivity in S/m.
    conductivity: List[float]
    #: Current density in A/m^2 where the tube's field is largest.
    current_density: List[float]


@dataclass(frozen=True)
class AnsweredResistanceProfile:
    """101 samples along the flow, at the operating point or per volt."""

    _NAMES: ClassVar[Mapping[str, str]] = {"current_density": "currentDensity"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"across": "AnsweredResistanceProfileAcross"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("coordinate", "unit", "per", "position", "potential", "field", "currentDensity", "conductivity")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Name of the coordinate along the flow.
    coordinate: str
    #: Unit of the positions.
    unit: str
    per: str
    #: Values of the coordinate from the high to the low terminal, m or rad.
    position: List[float]
    #: Potential against the low terminal in volts.
    potential: List[float]
    #: Field strength in V/m.
    field: List[float]
    #: Current density in A/m^2.
    current_density: List[float]
    #: Conductivity in S/m.
    conductivity: List[float]
    #: For a medium graded across the flow.
    across: Optional[AnsweredResistanceProfileAcross] = None


@dataclass(frozen=True)
class AnsweredResistanceCheck:
    """One of the engine's checks on this very answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("name", "applies")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    name: str
    #: false where the shape has nothing to compare; then `reason` says why.
    applies: bool
    passed: Optional[bool] = None
    #: Relative deviation found.
    deviation: Optional[float] = None
    #: Largest relative deviation that passes.
    tolerance: Optional[float] = None
    reason: Optional[str] = None


@dataclass(frozen=True)
class AnsweredResistanceMaterial:
    """A material used, with its version."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "version", "name")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    version: int
    name: str


@dataclass(frozen=True)
class AnsweredResistanceRecord:
    """Where the calculation was stored; only if `record` was in the request."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "url")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    #: Path of the stored record.
    url: str


@dataclass(frozen=True)
class AnsweredResistance:
    """A resistance, how sure it is and how it came about."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"resistance": "BoundedResistance", "conductance": "AnsweredResistanceConductance", "operating": "AnsweredResistanceOperating", "quadrature": "AnsweredResistanceQuadrature", "uncertainty": "Uncertainty", "peak": "AnsweredResistancePeak", "steps": ("list", "AnsweredResistanceStep"), "profile": "AnsweredResistanceProfile", "checks": ("list", "AnsweredResistanceCheck"), "sources": ("list", "ShapeSource"), "materials": ("list", "AnsweredResistanceMaterial"), "record": "AnsweredResistanceRecord"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("shape", "resistance", "conductance", "method", "operating", "cautions", "assumptions", "sources", "materials", "engine", "catalogue")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    shape: str
    resistance: BoundedResistance
    #: The reciprocal of the resistance.
    conductance: AnsweredResistanceConductance
    #: How the value was computed.
    method: str
    #: The operating point; voltage, current and power only where the request gave one of them.
    operating: AnsweredResistanceOperating
    cautions: List[str]
    assumptions: List[str]
    sources: List[ShapeSource]
    materials: List[AnsweredResistanceMaterial]
    engine: str
    catalogue: str
    #: How the integral went; only where the method is quadrature.
    quadrature: Optional[AnsweredResistanceQuadrature] = None
    uncertainty: Optional[Uncertainty] = None
    #: Whether the requirement is met; decided only if the bounds, and with `uncertainty` its range too, lie wholly on one side.
    verdict: Optional[str] = None
    #: Where the field and the current density are largest.
    peak: Optional[AnsweredResistancePeak] = None
    steps: Optional[List[AnsweredResistanceStep]] = None
    #: 101 samples along the flow, at the operating point or per volt.
    profile: Optional[AnsweredResistanceProfile] = None
    checks: Optional[List[AnsweredResistanceCheck]] = None
    #: Where the calculation was stored; only if `record` was in the request.
    record: Optional[AnsweredResistanceRecord] = None


@dataclass(frozen=True)
class AnsweredSizingTarget:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "ohm"}
    #: Resistance in ohms; lower ≤ value ≤ upper.
    value: float
    unit: str
    #: The value for people, rounded as its bounds allow.
    text: str


@dataclass(frozen=True)
class AnsweredSizingWithin:
    """A value of the dimension."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Value of the dimension in `unit`; as a bare number it goes back into `dimensions`.
    value: float
    unit: str
    #: The value for people; of a solution with at least as many digits as give the same resistance to 1e-5 when the text is used in a request.
    text: str


@dataclass(frozen=True)
class SizingSolution:
    """A value of the dimension with the resistance that it gives."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"dimension": "AnsweredSizingWithin", "resistance": "BoundedResistance", "conductance": "AnsweredResistanceConductance", "operating": "AnsweredResistanceOperating", "quadrature": "AnsweredResistanceQuadrature", "uncertainty": "Uncertainty", "peak": "AnsweredResistancePeak", "steps": ("list", "AnsweredResistanceStep"), "profile": "AnsweredResistanceProfile", "checks": ("list", "AnsweredResistanceCheck")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("dimension", "resistance", "sensitivity", "exact", "conductance", "method", "operating", "cautions")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: A value of the dimension.
    dimension: AnsweredSizingWithin
    resistance: BoundedResistance
    #: Derivative of the resistance by the dimension there, in ohms per `unit` of the dimension; for a whole number the change that one more makes, or that the last one made where no more are admitted.
    sensitivity: float
    #: Whether the target lies within the bounds of `resistance`, which is computed from this very value. False for the whole numbers on either side of the target where none gives it, and where a double cannot hold the dimension finely enough: `cautions` then say how far off it is, and which other dimension resolves it.
    exact: bool
    #: The reciprocal of the resistance.
    conductance: AnsweredResistanceConductance
    #: How the value was computed.
    method: str
    #: The operating point; voltage, current and power only where the request gave one of them.
    operating: AnsweredResistanceOperating
    cautions: List[str]
    #: How the integral went; only where the method is quadrature.
    quadrature: Optional[AnsweredResistanceQuadrature] = None
    uncertainty: Optional[Uncertainty] = None
    #: Whether the requirement is met; decided only if the bounds, and with `uncertainty` its range too, lie wholly on one side.
    verdict: Optional[str] = None
    #: Where the field and the current density are largest.
    peak: Optional[AnsweredResistancePeak] = None
    steps: Optional[List[AnsweredResistanceStep]] = None
    #: 101 samples along the flow, at the operating point or per volt.
    profile: Optional[AnsweredResistanceProfile] = None
    checks: Optional[List[AnsweredResistanceCheck]] = None


@dataclass(frozen=True)
class AnsweredSizing:
    """The values of one dimension that give a resistance."""

    _NAMES: ClassVar[Mapping[str, str]] = {"solve_for": "solveFor"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"target": "AnsweredSizingTarget", "within": ("list", "AnsweredSizingWithin"), "solutions": ("list", "SizingSolution"), "sources": ("list", "ShapeSource"), "materials": ("list", "AnsweredResistanceMaterial"), "record": "AnsweredResistanceRecord"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("solveFor", "target", "within", "solutions", "assumptions", "sources", "materials", "engine", "catalogue")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    solve_for: str
    target: AnsweredSizingTarget
    #: The range that was searched.
    within: List[AnsweredSizingWithin]
    #: All that lie in the range, smallest first.
    solutions: List[SizingSolution]
    assumptions: List[str]
    sources: List[ShapeSource]
    materials: List[AnsweredResistanceMaterial]
    engine: str
    catalogue: str
    #: The shape; left out for an outline.
    shape: Optional[str] = None
    #: Where the calculation was stored; only if `record` was in the request.
    record: Optional[AnsweredResistanceRecord] = None


@dataclass(frozen=True)
class ResistanceResult:
    """A resistance, how sure it is and how it came about."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"resistance": "BoundedResistance", "conductance": "AnsweredResistanceConductance", "operating": "AnsweredResistanceOperating", "quadrature": "AnsweredResistanceQuadrature", "uncertainty": "Uncertainty", "peak": "AnsweredResistancePeak", "steps": ("list", "AnsweredResistanceStep"), "profile": "AnsweredResistanceProfile", "checks": ("list", "AnsweredResistanceCheck"), "sources": ("list", "ShapeSource"), "materials": ("list", "AnsweredResistanceMaterial")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("shape", "resistance", "conductance", "method", "operating", "cautions", "assumptions", "sources", "materials", "engine", "catalogue")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    shape: str
    resistance: BoundedResistance
    #: The reciprocal of the resistance.
    conductance: AnsweredResistanceConductance
    #: How the value was computed.
    method: str
    #: The operating point; voltage, current and power only where the request gave one of them.
    operating: AnsweredResistanceOperating
    cautions: List[str]
    assumptions: List[str]
    sources: List[ShapeSource]
    materials: List[AnsweredResistanceMaterial]
    engine: str
    catalogue: str
    #: How the integral went; only where the method is quadrature.
    quadrature: Optional[AnsweredResistanceQuadrature] = None
    uncertainty: Optional[Uncertainty] = None
    #: Whether the requirement is met; decided only if the bounds, and with `uncertainty` its range too, lie wholly on one side.
    verdict: Optional[str] = None
    #: Where the field and the current density are largest.
    peak: Optional[AnsweredResistancePeak] = None
    steps: Optional[List[AnsweredResistanceStep]] = None
    #: 101 samples along the flow, at the operating point or per volt.
    profile: Optional[AnsweredResistanceProfile] = None
    checks: Optional[List[AnsweredResistanceCheck]] = None


@dataclass(frozen=True)
class AnsweredItem:
    """An item that was answered."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"result": "ResistanceResult"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("index", "status", "result")
    _FIXED: ClassVar[Mapping[str, Any]] = {"status": 200}
    #: Place in the request, from 0.
    index: int
    status: float
    result: ResistanceResult


@dataclass(frozen=True)
class RefusedItemProblemError:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("pointer", "detail")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: JSON pointer of the member, as a URI fragment.
    pointer: str
    detail: str
    #: Where on the outline, in its unit, if the place is no vertex: two edges that cross between their ends.
    at: Optional[List[Any]] = None


@dataclass(frozen=True)
class RefusedItemProblemError2:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("parameter", "detail")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Name of the query parameter.
    parameter: str
    detail: str


@dataclass(frozen=True)
class RefusedItemProblem:
    """What was wrong; pointers start at the item."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"errors": ("list", ("any", ("RefusedItemProblemError", "RefusedItemProblemError2",)))}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("type", "title", "status", "detail", "instance")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Page that explains the problem; its last part is the problem's code.
    type: str
    title: str
    status: int
    #: What happened this time, in one or two sentences.
    detail: str
    #: The request id, as in the Request-Id header.
    instance: str
    #: Every complaint about the input; the sentence goes on from the name of the place.
    errors: Optional[List[Union[RefusedItemProblemError, RefusedItemProblemError2]]] = None


@dataclass(frozen=True)
class RefusedItem:
    """An item that was refused or not computed."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"problem": "RefusedItemProblem"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("index", "status", "problem")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Place in the request, from 0.
    index: int
    #: 422 for a mistake in the item; 503 where the batch's time was over before it.
    status: int
    #: What was wrong; pointers start at the item.
    problem: RefusedItemProblem


@dataclass(frozen=True)
class BatchAnswerCounts:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {"not_computed": "notComputed"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("answered", "refused", "notComputed")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    answered: int
    refused: int
    #: Items for which the batch's time did not suffice.
    not_computed: int


@dataclass(frozen=True)
class BatchAnswer:
    """Every item answered or refused on its own."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"items": ("list", ("any", ("AnsweredItem", "RefusedItem",))), "counts": "BatchAnswerCounts"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("items", "counts")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: In the order of the request.
    items: List[Union[AnsweredItem, RefusedItem]]
    counts: BatchAnswerCounts


@dataclass(frozen=True)
class AnsweredNetworkResistance:
    """The resistance between the ports, with its bounds."""

    _NAMES: ClassVar[Mapping[str, str]] = {"bounds_basis": "boundsBasis"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text", "lower", "upper", "boundsBasis", "proved")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "ohm"}
    #: Resistance in ohms; lower ≤ value ≤ upper.
    value: float
    unit: str
    #: The value for people, rounded as its bounds allow.
    text: str
    #: Lower bound in ohms, below the upper one always.
    lower: float
    #: Upper bound in ohms.
    upper: float
    #: Where the bounds come from: rounding alone, or the elements' own bounds (all at their lowest, all at their highest; a network's resistance never falls when an element's rises) and rounding.
    bounds_basis: str
    #: Whether the bounds are proved for the stated problem.
    proved: bool


@dataclass(frozen=True)
class AnsweredNetworkUncertaintyContribution:
    """What one element or material contributes."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("sensitivity", "standard", "share")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Derivative of the network's resistance: ohm per ohm of the element, or ohm per unit of the material's ratio of true to nominal resistivity.
    sensitivity: float
    #: Standard uncertainty of the element (ohm) or of the ratio.
    standard: float
    #: Part of the whole, 0 … 1: of the variance, or for `worst-case` of the elements' spans to first order.
    share: float
    #: Name of the element, or else:
    element: Optional[str] = None
    #: A material whose stated uncertainty all its elements share; for `worst-case` it counts within them.
    material: Optional[str] = None


@dataclass(frozen=True)
class AnsweredNetworkUncertainty:
    """How far the network's resistance strays with its elements; bounds are a separate statement."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"contributions": ("list", "AnsweredNetworkUncertaintyContribution")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("method", "standard", "low", "high", "coverage", "text", "basis", "contributions")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    method: str
    #: Standard uncertainty of the resistance in ohms; for `worst-case` that of first-order propagation.
    standard: float
    #: Lower end of the range in ohms.
    low: float
    #: Upper end of the range in ohms.
    high: float
    #: Probability that the range covers the resistance: 0.95; 1 for `worst-case`, whose range is the whole box.
    coverage: float
    #: The range for people, rounded by JCGM 100, 7.2.6.
    text: str
    #: How the range was found, in one or two sentences.
    basis: str
    #: The budget, largest share first.
    contributions: List[AnsweredNetworkUncertaintyContribution]


@dataclass(frozen=True)
class AnsweredNetworkNode:
    """A node."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("name", "voltage")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    name: str
    #: Potential against the second port, V.
    voltage: float


@dataclass(frozen=True)
class AnsweredNetworkElementBounds:
    """How sure its resistance is, where a request gave it."""

    _NAMES: ClassVar[Mapping[str, str]] = {"bounds_basis": "boundsBasis"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("lower", "upper", "boundsBasis", "proved")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Lower bound, ohm.
    lower: float
    #: Upper bound, ohm.
    upper: float
    #: Where the bounds come from: rounding (closed form or converged series), quadrature (error estimate), rayleigh (conducting sheets and insulating walls), formula-accuracy (stated accuracy of a published formula), energy (two field solutions), energy-quadrature (the same with estimated integrals).
    bounds_basis: str
    proved: bool


@dataclass(frozen=True)
class AnsweredNetworkElement:
    """An element with what passes through it."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"bounds": "AnsweredNetworkElementBounds"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("name", "between", "resistance", "current", "voltage", "power", "share", "sensitivity")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    name: str
    between: List[str]
    #: Resistance, ohm.
    resistance: float
    #: Current from its first node to its second, A.
    current: float
    #: Potential of its first node above its second, V.
    voltage: float
    #: Power turned to heat, W.
    power: float
    #: Its part of the whole power, 0 … 1.
    share: float
    #: By how much the network's resistance rises when its own rises, ohm per ohm: the square of its part of the current.
    sensitivity: float
    #: How sure its resistance is, where a request gave it.
    bounds: Optional[AnsweredNetworkElementBounds] = None


@dataclass(frozen=True)
class AnsweredNetworkCheck:
    """
    One of the checks on this very answer: currents at each node add up to nothing (current-law), element
    voltages are differences of node voltages (voltage-law), the elements' power is that of the ports
    (power-balance).
    """

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("name", "applies", "passed", "deviation", "tolerance")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    name: str
    applies: bool
    passed: bool
    #: Largest relative deviation found.
    deviation: float
    #: Largest deviation that passes.
    tolerance: float


@dataclass(frozen=True)
class AnsweredNetwork:
    """The resistance between the ports, element by element."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"resistance": "AnsweredNetworkResistance", "conductance": "AnsweredResistanceConductance", "operating": "AnsweredResistanceOperating", "uncertainty": "AnsweredNetworkUncertainty", "nodes": ("list", "AnsweredNetworkNode"), "elements": ("list", "AnsweredNetworkElement"), "checks": ("list", "AnsweredNetworkCheck"), "sources": ("list", "ShapeSource"), "materials": ("list", "AnsweredResistanceMaterial"), "record": "AnsweredResistanceRecord"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("resistance", "conductance", "operating", "per", "nodes", "elements", "checks", "cautions", "assumptions", "sources", "materials", "engine", "catalogue")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: The resistance between the ports, with its bounds.
    resistance: AnsweredNetworkResistance
    #: The reciprocal of the resistance.
    conductance: AnsweredResistanceConductance
    #: The operating point; voltage, current and power only where the request gave one of them.
    operating: AnsweredResistanceOperating
    #: Whether nodes and elements are told at the operating point or for one volt between the ports.
    per: str
    nodes: List[AnsweredNetworkNode]
    elements: List[AnsweredNetworkElement]
    checks: List[AnsweredNetworkCheck]
    cautions: List[str]
    assumptions: List[str]
    sources: List[ShapeSource]
    materials: List[AnsweredResistanceMaterial]
    engine: str
    catalogue: str
    #: How far the network's resistance strays with its elements; bounds are a separate statement.
    uncertainty: Optional[AnsweredNetworkUncertainty] = None
    #: Whether the requirement is met; decided only if the bounds, and with `uncertainty` its range too, lie wholly on one side.
    verdict: Optional[str] = None
    #: Where the calculation was stored; only if `record` was in the request.
    record: Optional[AnsweredResistanceRecord] = None


@dataclass(frozen=True)
class OutlineOutlineOuter2:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {"arc_to": "arcTo"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("arcTo", "center")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    arc_to: List[Any]
    center: List[Any]
    clockwise: Optional[bool] = None


@dataclass(frozen=True)
class OutlineOutline:
    """The outline as it was cleaned."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"outer": ("list", ("any", ("OutlineOutlineOuter2",))), "holes": ("list", ("list", ("any", ("OutlineOutlineOuter2",))))}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("outer",)
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    outer: List[Union[List[Any], OutlineOutlineOuter2]]
    unit: Optional[str] = None
    holes: Optional[List[List[Union[List[Any], OutlineOutlineOuter2]]]] = None
    symmetry: Optional[str] = None


@dataclass(frozen=True)
class OutlineTerminalPart:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {"from_": "from"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("ring", "edge")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    ring: int
    edge: int
    from_: Optional[float] = None
    to: Optional[float] = None


@dataclass(frozen=True)
class OutlineTerminal:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"parts": ("list", "OutlineTerminalPart")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("name",)
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    name: str
    segments: Optional[List[List[Any]]] = None
    parts: Optional[List[OutlineTerminalPart]] = None


@dataclass(frozen=True)
class Outline:
    """A stored outline."""

    _NAMES: ClassVar[Mapping[str, str]] = {"created_at": "createdAt"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"outline": "OutlineOutline", "terminals": ("list", "OutlineTerminal")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "name", "createdAt", "outline", "terminals", "regions", "repairs")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    #: Empty where it was stored without one.
    name: str
    created_at: str
    #: The outline as it was cleaned.
    outline: OutlineOutline
    terminals: List[OutlineTerminal]
    #: Regions found on the drawing; none for JSON.
    regions: List[Any]
    #: What was put right, as sentences.
    repairs: List[str]


@dataclass(frozen=True)
class FieldProgress:
    """The bracket so far; null before the first one."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("lower", "upper", "unknowns", "refinements")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Lower bound so far, in ohms.
    lower: float
    #: Upper bound so far, in ohms.
    upper: float
    unknowns: int
    refinements: int


@dataclass(frozen=True)
class FieldResultResistance:
    """Between the two terminals; left out for three and more."""

    _NAMES: ClassVar[Mapping[str, str]] = {"bounds_basis": "boundsBasis"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text", "lower", "upper", "boundsBasis", "proved")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "ohm"}
    #: Resistance in ohms; lower ≤ value ≤ upper.
    value: float
    unit: str
    #: The value for people, rounded as its bounds allow.
    text: str
    #: Lower bound in ohms, below the upper one always.
    lower: float
    #: Upper bound in ohms.
    upper: float
    #: Where the bounds come from: rounding (closed form or converged series), quadrature (error estimate), rayleigh (conducting sheets and insulating walls), formula-accuracy (stated accuracy of a published formula), energy (two field solutions), energy-quadrature (the same with estimated integrals).
    bounds_basis: str
    #: Whether the bounds are proved for the stated problem.
    proved: bool


@dataclass(frozen=True)
class FieldResultSquares:
    """The resistance over the sheet resistance, for a uniform sheet."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text", "lower", "upper")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "square"}
    #: Resistance in squares; lower ≤ value ≤ upper.
    value: float
    unit: str
    text: str
    lower: float
    upper: float


@dataclass(frozen=True)
class FieldResultConductanceBounds:
    """Bounds of each entry of `conductance`, in siemens."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("lower", "upper")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    lower: List[List[float]]
    upper: List[List[float]]


@dataclass(frozen=True)
class FieldResultPairFloating:
    """With the other terminals left open."""

    _NAMES: ClassVar[Mapping[str, str]] = {"bounds_basis": "boundsBasis"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text", "lower", "upper", "boundsBasis", "proved")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "ohm"}
    #: Resistance in ohms; null where the coupling could not be told from none.
    value: Optional[float]
    unit: str
    text: str
    #: Lower bound in ohms.
    lower: float
    #: Upper bound in ohms; null where there is none.
    upper: Optional[float]
    bounds_basis: str
    proved: bool


@dataclass(frozen=True)
class FieldResultPairGrounded:
    """One volt over the current that reaches the second, with all others at zero."""

    _NAMES: ClassVar[Mapping[str, str]] = {"bounds_basis": "boundsBasis"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text", "lower", "upper", "boundsBasis", "proved")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "ohm"}
    #: Resistance in ohms; null where the coupling could not be told from none.
    value: Optional[float]
    unit: str
    text: str
    #: Lower bound in ohms.
    lower: float
    #: Upper bound in ohms; null where there is none.
    upper: Optional[float]
    bounds_basis: str
    proved: bool


@dataclass(frozen=True)
class FieldResultPair:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"floating": "FieldResultPairFloating", "grounded": "FieldResultPairGrounded"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("between", "floating", "grounded")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Names of two terminals.
    between: List[Any]
    #: With the other terminals left open.
    floating: FieldResultPairFloating
    #: One volt over the current that reaches the second, with all others at zero.
    grounded: FieldResultPairGrounded


@dataclass(frozen=True)
class FieldResultPeakPosition:
    """A place on the outline."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("x", "y", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: In the outline's unit.
    x: float
    #: In the outline's unit.
    y: float
    #: The outline's unit.
    unit: str
    text: str


@dataclass(frozen=True)
class FieldResultPeakDistance:
    """Distance from the position at which the values were read."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "m"}
    value: float
    unit: str
    #: The value for people.
    text: str


@dataclass(frozen=True)
class FieldResultPeakField:
    """Field strength."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {"unit": "V/m"}
    value: float
    unit: str
    #: The value for people.
    text: str


@dataclass(frozen=True)
class FieldResultPeakCurrentDensity:
    """Current density: of the sheet in A/m, or in A/m² where the outline is axisymmetric."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("value", "unit", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    value: float
    unit: str
    #: The value for people.
    text: str


@dataclass(frozen=True)
class FieldResultPeak:
    """Where the current crowds."""

    _NAMES: ClassVar[Mapping[str, str]] = {"current_density": "currentDensity"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"position": "FieldResultPeakPosition", "distance": "FieldResultPeakDistance", "field": "FieldResultPeakField", "current_density": "FieldResultPeakCurrentDensity"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("unbounded", "position", "distance", "field", "currentDensity", "per", "text")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Whether the density grows without limit towards the position, as it does at re-entrant corners and where a terminal ends on an edge.
    unbounded: bool
    #: A place on the outline.
    position: FieldResultPeakPosition
    #: Distance from the position at which the values were read.
    distance: Optional[FieldResultPeakDistance]
    #: Field strength.
    field: FieldResultPeakField
    #: Current density: of the sheet in A/m, or in A/m² where the outline is axisymmetric.
    current_density: FieldResultPeakCurrentDensity
    #: Whether the values hold at the operating point or at one volt.
    per: str
    #: The peak in one sentence.
    text: str


@dataclass(frozen=True)
class FieldResultMesh:
    """The mesh of the last refinement."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("triangles", "unknowns", "refinements")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    triangles: int
    #: Unknowns of one of the two solutions.
    unknowns: int
    refinements: int


@dataclass(frozen=True)
class FieldResult:
    """A field solution."""

    _NAMES: ClassVar[Mapping[str, str]] = {"conductance_bounds": "conductanceBounds"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"resistance": "FieldResultResistance", "squares": "FieldResultSquares", "conductance_bounds": "FieldResultConductanceBounds", "pairs": ("list", "FieldResultPair"), "operating": "AnsweredResistanceOperating", "peak": "FieldResultPeak", "mesh": "FieldResultMesh", "checks": ("list", "AnsweredResistanceCheck"), "materials": ("list", "AnsweredResistanceMaterial")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("method", "operating", "mesh", "seconds", "checks", "repairs", "cautions", "assumptions", "materials", "engine")
    _FIXED: ClassVar[Mapping[str, Any]] = {"method": "field"}
    method: str
    #: The operating point; voltage, current and power only where the request gave one of them.
    operating: AnsweredResistanceOperating
    #: The mesh of the last refinement.
    mesh: FieldResultMesh
    #: Time the solution took, in seconds.
    seconds: float
    checks: List[AnsweredResistanceCheck]
    #: What was put right on the outline, as sentences.
    repairs: List[str]
    cautions: List[str]
    assumptions: List[str]
    materials: List[AnsweredResistanceMaterial]
    engine: str
    #: Between the two terminals; left out for three and more.
    resistance: Optional[FieldResultResistance] = None
    #: The resistance over the sheet resistance, for a uniform sheet.
    squares: Optional[FieldResultSquares] = None
    #: For three terminals and more: the current into terminal i in amperes for one volt at terminal j, all others at zero.
    conductance: Optional[List[List[float]]] = None
    #: Bounds of each entry of `conductance`, in siemens.
    conductance_bounds: Optional[FieldResultConductanceBounds] = None
    #: For three terminals and more: each pair.
    pairs: Optional[List[FieldResultPair]] = None
    #: Where the current crowds.
    peak: Optional[FieldResultPeak] = None
    #: Whether the requirement is met; decided only if the bounds, and with `uncertainty` its range too, lie wholly on one side.
    verdict: Optional[str] = None
    #: Which cap ended the work before the wanted accuracy, for a status `limited`.
    limit: Optional[str] = None


@dataclass(frozen=True)
class FieldRecord:
    """The record, where one was asked for and the solution is finished."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "url")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    url: str


@dataclass(frozen=True)
class FieldReplayRecord:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "url")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    url: str


@dataclass(frozen=True)
class FieldReplayBefore:
    """What the record holds."""

    _NAMES: ClassVar[Mapping[str, str]] = {"conductance_bounds": "conductanceBounds"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"resistance": "FieldResultResistance", "squares": "FieldResultSquares", "conductance_bounds": "FieldResultConductanceBounds", "pairs": ("list", "FieldResultPair"), "operating": "AnsweredResistanceOperating", "peak": "FieldResultPeak", "mesh": "FieldResultMesh", "checks": ("list", "AnsweredResistanceCheck"), "materials": ("list", "AnsweredResistanceMaterial")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("method", "operating", "mesh", "seconds", "checks", "repairs", "cautions", "assumptions", "materials", "engine")
    _FIXED: ClassVar[Mapping[str, Any]] = {"method": "field"}
    method: str
    #: The operating point; voltage, current and power only where the request gave one of them.
    operating: AnsweredResistanceOperating
    #: The mesh of the last refinement.
    mesh: FieldResultMesh
    #: Time the solution took, in seconds.
    seconds: float
    checks: List[AnsweredResistanceCheck]
    #: What was put right on the outline, as sentences.
    repairs: List[str]
    cautions: List[str]
    assumptions: List[str]
    materials: List[AnsweredResistanceMaterial]
    engine: str
    #: Between the two terminals; left out for three and more.
    resistance: Optional[FieldResultResistance] = None
    #: The resistance over the sheet resistance, for a uniform sheet.
    squares: Optional[FieldResultSquares] = None
    #: For three terminals and more: the current into terminal i in amperes for one volt at terminal j, all others at zero.
    conductance: Optional[List[List[float]]] = None
    #: Bounds of each entry of `conductance`, in siemens.
    conductance_bounds: Optional[FieldResultConductanceBounds] = None
    #: For three terminals and more: each pair.
    pairs: Optional[List[FieldResultPair]] = None
    #: Where the current crowds.
    peak: Optional[FieldResultPeak] = None
    #: Whether the requirement is met; decided only if the bounds, and with `uncertainty` its range too, lie wholly on one side.
    verdict: Optional[str] = None
    #: Which cap ended the work before the wanted accuracy, for a status `limited`.
    limit: Optional[str] = None


@dataclass(frozen=True)
class FieldReplay:
    """For the replay of a record: what it repeats."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"record": "FieldReplayRecord", "before": "FieldReplayBefore"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("record", "before", "drift", "identical")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    record: FieldReplayRecord
    #: What the record holds.
    before: FieldReplayBefore
    #: (now − before)/before of the resistance, of the pair that changed most for three terminals and more; null until the solution is finished.
    drift: Optional[float]
    #: Whether values and bounds are the same to the last bit; null until it is finished.
    identical: Optional[bool]


@dataclass(frozen=True)
class Field:
    """A field solution, finished or on its way."""

    _NAMES: ClassVar[Mapping[str, str]] = {"created_at": "createdAt", "finished_at": "finishedAt"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"progress": "FieldProgress", "result": "FieldResult", "record": "FieldRecord", "replay": "FieldReplay"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "status", "createdAt", "finishedAt", "progress", "result")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    #: `limited`: a cap on unknowns or time was met; the bracket reached stands. `failed`: `failure` says why.
    status: str
    created_at: str
    finished_at: Optional[str]
    #: The bracket so far; null before the first one.
    progress: Optional[FieldProgress]
    result: Optional[FieldResult]
    #: Why there is no result, for a status `failed`.
    failure: Optional[str] = None
    #: The record, where one was asked for and the solution is finished.
    record: Optional[FieldRecord] = None
    #: For the replay of a record: what it repeats.
    replay: Optional[FieldReplay] = None


@dataclass(frozen=True)
class FieldMapEquipotential:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("potential", "lines")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Volts, for one volt.
    potential: float
    lines: List[List[float]]


@dataclass(frozen=True)
class FieldMapRaster:
    """The current density on a grid."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("origin", "cell", "columns", "rows", "density")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Centre of the first cell, lower left.
    origin: List[Any]
    #: Size of a cell.
    cell: float
    columns: int
    rows: int
    #: Size of the current density for one volt, row by row from below, in A/m (A/m² where axisymmetric); null outside.
    density: List[Optional[float]]


@dataclass(frozen=True)
class FieldMapEdge:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {"from_": "from"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("from", "to", "ring", "terminal", "current")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    from_: List[Any]
    to: List[Any]
    ring: int
    terminal: str
    #: Into the conductor, in amperes for one volt.
    current: float


@dataclass(frozen=True)
class FieldMap:
    """A field solution as lines, raster and fluxes."""

    _NAMES: ClassVar[Mapping[str, str]] = {"current_between_streamlines": "currentBetweenStreamlines"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"equipotentials": ("list", "FieldMapEquipotential"), "raster": "FieldMapRaster", "edges": ("list", "FieldMapEdge")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("unit", "per", "between", "equipotentials", "streamlines", "currentBetweenStreamlines", "raster", "edges")
    _FIXED: ClassVar[Mapping[str, Any]] = {"per": "volt"}
    #: Unit of all coordinates here.
    unit: str
    per: str
    #: The high and the low terminal.
    between: List[Any]
    equipotentials: List[FieldMapEquipotential]
    #: From the high terminal; the same current passes between any two neighbours.
    streamlines: List[List[float]]
    #: In amperes, for one volt.
    current_between_streamlines: float
    #: The current density on a grid.
    raster: FieldMapRaster
    #: Pieces of the terminals with the current through each.
    edges: List[FieldMapEdge]


@dataclass(frozen=True)
class FieldLine:
    """Potential and current density along a straight line."""

    _NAMES: ClassVar[Mapping[str, str]] = {"density_along": "densityAlong"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("unit", "per", "distance", "points", "potential", "density", "densityAlong")
    _FIXED: ClassVar[Mapping[str, Any]] = {"per": "volt"}
    unit: str
    per: str
    #: From the start, in metres.
    distance: List[float]
    #: In the outline's unit.
    points: List[List[Any]]
    #: Volts for one volt; null outside.
    potential: List[Optional[float]]
    #: Size of the current density for one volt, A/m (A/m² where axisymmetric).
    density: List[Optional[float]]
    #: Its component along the line.
    density_along: List[Optional[float]]


@dataclass(frozen=True)
class MaterialResistivity:
    """ρ = resistivity·(1 + coefficient·(T − reference))."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("model", "resistivity", "coefficient", "reference")
    _FIXED: ClassVar[Mapping[str, Any]] = {"model": "linear"}
    model: str
    #: Resistivity in ohm metres at the reference temperature.
    resistivity: float
    #: Temperature coefficient in 1/K at the reference temperature.
    coefficient: float
    #: Reference temperature in °C.
    reference: float


@dataclass(frozen=True)
class MaterialResistivity2:
    """A polynomial in (T − reference)."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("model", "quantity", "reference", "coefficients")
    _FIXED: ClassVar[Mapping[str, Any]] = {"model": "polynomial"}
    model: str
    quantity: str
    #: Temperature in °C at which the powers vanish.
    reference: float
    #: Coefficients of the powers 0, 1, 2 … of (T − reference), in ohm m or S/m.
    coefficients: List[float]


@dataclass(frozen=True)
class MaterialResistivity3:
    """Values at given temperatures, interpolated."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("model", "quantity", "temperatures", "values", "interpolation")
    _FIXED: ClassVar[Mapping[str, Any]] = {"model": "table"}
    model: str
    quantity: str
    #: Temperatures in °C, increasing.
    temperatures: List[float]
    #: Values in ohm m or S/m.
    values: List[float]
    interpolation: str


@dataclass(frozen=True)
class MaterialResistivity4:
    """A resistivity that is not given as a function of temperature, such as that of a soil."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("model", "resistivity")
    _FIXED: ClassVar[Mapping[str, Any]] = {"model": "constant"}
    model: str
    #: Resistivity in ohm metres over the whole range.
    resistivity: float


@dataclass(frozen=True)
class MaterialResistivity5:
    """Silicon at 23 °C by dopant density (ASTM F723 fits)."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("model", "type", "density")
    _FIXED: ClassVar[Mapping[str, Any]] = {"model": "silicon"}
    model: str
    #: n: phosphorus, p: boron.
    type: str
    #: Dopant density in 1/cm³.
    density: float


@dataclass(frozen=True)
class MaterialResistivity6:
    """Sea water at atmospheric pressure by the Practical Salinity Scale 1978."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("model", "salinity")
    _FIXED: ClassVar[Mapping[str, Any]] = {"model": "sea-water"}
    model: str
    #: Practical salinity, 2 to 42.
    salinity: float


@dataclass(frozen=True)
class MaterialRange:
    """Temperatures for which the model holds, °C."""

    _NAMES: ClassVar[Mapping[str, str]] = {"from_": "from"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("from", "to")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Lowest temperature in °C.
    from_: float
    #: Highest temperature in °C.
    to: float


@dataclass(frozen=True)
class MaterialUncertainty:
    """Nominal uncertainty: the true resistivity lies between lower and upper times the nominal one."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("lower", "upper", "note")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Smallest ratio of true to nominal resistivity.
    lower: float
    #: Largest ratio of true to nominal resistivity.
    upper: float
    #: What the ratios stand for.
    note: str


@dataclass(frozen=True)
class Material:
    """A material with its law of resistivity."""

    _NAMES: ClassVar[Mapping[str, str]] = {"retired_at": "retiredAt"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"resistivity": ("any", ("MaterialResistivity", "MaterialResistivity2", "MaterialResistivity3", "MaterialResistivity4", "MaterialResistivity5", "MaterialResistivity6",)), "range": "MaterialRange", "uncertainty": "MaterialUncertainty"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "version", "name", "kind", "resistivity", "range", "uncertainty", "source", "provenance", "owner", "retiredAt")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Name in requests: lower case, digits and hyphens.
    id: str
    #: Every change makes the next version.
    version: int
    name: str
    #: What sort of material it is.
    kind: str
    #: The law of resistivity against temperature.
    resistivity: Union[MaterialResistivity, MaterialResistivity2, MaterialResistivity3, MaterialResistivity4, MaterialResistivity5, MaterialResistivity6]
    #: Temperatures for which the model holds, °C.
    range: MaterialRange
    #: Nominal uncertainty: the true resistivity lies between lower and upper times the nominal one.
    uncertainty: MaterialUncertainty
    #: Where the data come from.
    source: str
    provenance: str
    #: `library`, or the team that owns it.
    owner: str
    #: When the team withdrew it; null while it is in use. Records keep what they used.
    retired_at: Optional[str]
    #: What a user should know.
    note: Optional[str] = None


@dataclass(frozen=True)
class MaterialPage:
    """A page of materials."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"items": ("list", "Material")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("items", "next")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    items: List[Material]
    #: Cursor of the next page; null on the last one.
    next: Optional[str]


@dataclass(frozen=True)
class RecordBy:
    """Who stored it."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("kind", "id", "name")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    kind: str
    id: str
    name: str


@dataclass(frozen=True)
class SizingResult:
    """The values of one dimension that give a resistance."""

    _NAMES: ClassVar[Mapping[str, str]] = {"solve_for": "solveFor"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"target": "AnsweredSizingTarget", "within": ("list", "AnsweredSizingWithin"), "solutions": ("list", "SizingSolution"), "sources": ("list", "ShapeSource"), "materials": ("list", "AnsweredResistanceMaterial")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("solveFor", "target", "within", "solutions", "assumptions", "sources", "materials", "engine", "catalogue")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    solve_for: str
    target: AnsweredSizingTarget
    #: The range that was searched.
    within: List[AnsweredSizingWithin]
    #: All that lie in the range, smallest first.
    solutions: List[SizingSolution]
    assumptions: List[str]
    sources: List[ShapeSource]
    materials: List[AnsweredResistanceMaterial]
    engine: str
    catalogue: str
    #: The shape; left out for an outline.
    shape: Optional[str] = None


@dataclass(frozen=True)
class NetworkResult:
    """The resistance between the ports, and what passes through each element."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"resistance": "AnsweredNetworkResistance", "conductance": "AnsweredResistanceConductance", "operating": "AnsweredResistanceOperating", "uncertainty": "AnsweredNetworkUncertainty", "nodes": ("list", "AnsweredNetworkNode"), "elements": ("list", "AnsweredNetworkElement"), "checks": ("list", "AnsweredNetworkCheck"), "sources": ("list", "ShapeSource"), "materials": ("list", "AnsweredResistanceMaterial")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("resistance", "conductance", "operating", "per", "nodes", "elements", "checks", "cautions", "assumptions", "sources", "materials", "engine", "catalogue")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: The resistance between the ports, with its bounds.
    resistance: AnsweredNetworkResistance
    #: The reciprocal of the resistance.
    conductance: AnsweredResistanceConductance
    #: The operating point; voltage, current and power only where the request gave one of them.
    operating: AnsweredResistanceOperating
    #: Whether nodes and elements are told at the operating point or for one volt between the ports.
    per: str
    nodes: List[AnsweredNetworkNode]
    elements: List[AnsweredNetworkElement]
    checks: List[AnsweredNetworkCheck]
    cautions: List[str]
    assumptions: List[str]
    sources: List[ShapeSource]
    materials: List[AnsweredResistanceMaterial]
    engine: str
    catalogue: str
    #: How far the network's resistance strays with its elements; bounds are a separate statement.
    uncertainty: Optional[AnsweredNetworkUncertainty] = None
    #: Whether the requirement is met; decided only if the bounds, and with `uncertainty` its range too, lie wholly on one side.
    verdict: Optional[str] = None


@dataclass(frozen=True)
class RecordMaterial:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "version")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    version: int


@dataclass(frozen=True)
class Record:
    """A stored calculation."""

    _NAMES: ClassVar[Mapping[str, str]] = {"created_at": "createdAt"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"by": "RecordBy", "result": ("any", ("ResistanceResult", "SizingResult", "NetworkResult", "FieldResult",)), "materials": ("list", "RecordMaterial")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "operation", "label", "createdAt", "by", "request", "result", "materials", "engine", "catalogue")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    #: What computed it: `resistance`, `sizing`, `network` or `field`.
    operation: str
    label: str
    created_at: str
    #: Who stored it.
    by: RecordBy
    #: What was asked.
    request: Dict[str, Any]
    #: What came out: a ResistanceResult, a SizingResult where `operation` is `sizing`, a NetworkResult where it is `network`, or a FieldResult where it is `field`.
    result: Union[ResistanceResult, SizingResult, NetworkResult, FieldResult]
    #: Materials that went in, with the versions that a replay uses.
    materials: List[RecordMaterial]
    #: Version of the engine that computed it.
    engine: str
    catalogue: str


@dataclass(frozen=True)
class RecordPage:
    """A page of records."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"items": ("list", "Record")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("items", "next")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    items: List[Record]
    #: Cursor of the next page; null on the last one.
    next: Optional[str]


@dataclass(frozen=True)
class Replay:
    """A stored calculation beside the same one computed today."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"before": ("any", ("ResistanceResult", "SizingResult", "NetworkResult",)), "now": ("any", ("ResistanceResult", "SizingResult", "NetworkResult",))}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("before", "now", "drift", "identical")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    before: Union[ResistanceResult, SizingResult, NetworkResult]
    now: Union[ResistanceResult, SizingResult, NetworkResult]
    #: (now − before)/before of the resistance; of a sizing, of the dimension found.
    drift: float
    #: Whether value, bounds and uncertainty, or the dimensions found, are the same to the last bit.
    identical: bool


@dataclass(frozen=True)
class KeyQuotas:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("minute", "month")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Requests a minute.
    minute: int
    #: Computations a calendar month (UTC).
    month: int


@dataclass(frozen=True)
class Key:
    """A key of the team, without its secret."""

    _NAMES: ClassVar[Mapping[str, str]] = {"allowed_in_url": "allowedInUrl", "created_at": "createdAt", "created_by": "createdBy", "expires_at": "expiresAt", "revoked_at": "revokedAt", "last_used_at": "lastUsedAt", "last_client": "lastClient"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"quotas": "KeyQuotas"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "name", "team", "scopes", "quotas", "origins", "allowedInUrl", "state", "createdAt", "createdBy", "expiresAt", "revokedAt", "lastUsedAt", "lastClient")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    name: str
    #: Short name of the team that owns it.
    team: str
    scopes: List[str]
    quotas: KeyQuotas
    #: Origins of browser pages that may call with it.
    origins: List[str]
    #: Whether it may come as `?key=`.
    allowed_in_url: bool
    state: str
    #: When it was issued.
    created_at: str
    #: Who issued it.
    created_by: str
    #: When it ends.
    expires_at: Optional[str]
    #: When it was revoked.
    revoked_at: Optional[str]
    #: Its last call.
    last_used_at: Optional[str]
    #: Kind of client of its last call.
    last_client: Optional[str]


@dataclass(frozen=True)
class KeyPage:
    """A page of keys."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"items": ("list", "Key")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("items", "next")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    items: List[Key]
    #: Cursor of the next page; null on the last one.
    next: Optional[str]


@dataclass(frozen=True)
class IssuedKey:
    """A key that has just been issued."""

    _NAMES: ClassVar[Mapping[str, str]] = {"allowed_in_url": "allowedInUrl", "created_at": "createdAt", "created_by": "createdBy", "expires_at": "expiresAt", "revoked_at": "revokedAt", "last_used_at": "lastUsedAt", "last_client": "lastClient"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"quotas": "KeyQuotas"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "name", "team", "scopes", "quotas", "origins", "allowedInUrl", "state", "createdAt", "createdBy", "expiresAt", "revokedAt", "lastUsedAt", "lastClient")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    name: str
    #: Short name of the team that owns it.
    team: str
    scopes: List[str]
    quotas: KeyQuotas
    #: Origins of browser pages that may call with it.
    origins: List[str]
    #: Whether it may come as `?key=`.
    allowed_in_url: bool
    state: str
    #: When it was issued.
    created_at: str
    #: Who issued it.
    created_by: str
    #: When it ends.
    expires_at: Optional[str]
    #: When it was revoked.
    revoked_at: Optional[str]
    #: Its last call.
    last_used_at: Optional[str]
    #: Kind of client of its last call.
    last_client: Optional[str]
    #: The whole key, shown this once; absent when an idempotent call is repeated.
    key: Optional[str] = None


@dataclass(frozen=True)
class RotatedKey:
    """A key with a new secret."""

    _NAMES: ClassVar[Mapping[str, str]] = {"allowed_in_url": "allowedInUrl", "created_at": "createdAt", "created_by": "createdBy", "expires_at": "expiresAt", "revoked_at": "revokedAt", "last_used_at": "lastUsedAt", "last_client": "lastClient", "previous_until": "previousUntil"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"quotas": "KeyQuotas"}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("id", "name", "team", "scopes", "quotas", "origins", "allowedInUrl", "state", "createdAt", "createdBy", "expiresAt", "revokedAt", "lastUsedAt", "lastClient", "previousUntil")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    id: str
    name: str
    #: Short name of the team that owns it.
    team: str
    scopes: List[str]
    quotas: KeyQuotas
    #: Origins of browser pages that may call with it.
    origins: List[str]
    #: Whether it may come as `?key=`.
    allowed_in_url: bool
    state: str
    #: When it was issued.
    created_at: str
    #: Who issued it.
    created_by: str
    #: When it ends.
    expires_at: Optional[str]
    #: When it was revoked.
    revoked_at: Optional[str]
    #: Its last call.
    last_used_at: Optional[str]
    #: Kind of client of its last call.
    last_client: Optional[str]
    #: When the secret before ends.
    previous_until: str
    #: The key with its new secret, shown this once; absent when a call is repeated.
    key: Optional[str] = None


@dataclass(frozen=True)
class UsageMinute:
    """Requests a minute."""

    _NAMES: ClassVar[Mapping[str, str]] = {"resets_at": "resetsAt"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("quota", "remaining", "resetsAt")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    quota: int
    remaining: int
    resets_at: str


@dataclass(frozen=True)
class UsageMonth:
    """Computations of the calendar month (UTC)."""

    _NAMES: ClassVar[Mapping[str, str]] = {"resets_at": "resetsAt"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("quota", "remaining", "resetsAt")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    quota: int
    remaining: int
    resets_at: str


@dataclass(frozen=True)
class UsageByDay:
    """Part of an answer."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("day", "requests", "computations", "refused")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    day: str
    requests: int
    computations: int
    #: Requests answered with 400 or above.
    refused: int


@dataclass(frozen=True)
class Usage:
    """A key's usage and quotas."""

    _NAMES: ClassVar[Mapping[str, str]] = {"by_day": "byDay"}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {"minute": "UsageMinute", "month": "UsageMonth", "by_day": ("list", "UsageByDay")}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("key", "scopes", "minute", "month", "byDay")
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    #: Id of the key.
    key: str
    scopes: List[str]
    #: Requests a minute.
    minute: UsageMinute
    #: Computations of the calendar month (UTC).
    month: UsageMonth
    by_day: List[UsageByDay]


@dataclass(frozen=True)
class ReadOpenApiAnswer:
    """An OpenAPI 3.1 document."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("openapi",)
    _FIXED: ClassVar[Mapping[str, Any]] = {}
    openapi: str


@dataclass(frozen=True)
class Health:
    """Liveness and versions."""

    _NAMES: ClassVar[Mapping[str, str]] = {}
    _SPECS: ClassVar[Mapping[str, _Spec]] = {}
    _REQUIRED: ClassVar[Tuple[str, ...]] = ("status", "engine", "catalogue")
    _FIXED: ClassVar[Mapping[str, Any]] = {"status": "ok"}
    status: str
    engine: str
    catalogue: str


class _Operations(_Transport):
    """The API's operations, one method each."""

    def list_shapes(self, *, limit: Any = None, cursor: Any = None) -> Catalogue:
        """List the catalogue: ``GET /shapes``."""
        return _read("Catalogue", self.call("GET", "/shapes", query={"limit": limit, "cursor": cursor}))

    def read_shape(self, shape: str) -> Shape:
        """Read one shape: ``GET /shapes/{shape}``."""
        return _read("Shape", self.call("GET", f"/shapes/{urllib.parse.quote(shape, safe='')}"))

    def compute_resistance(self, body: Any, *, idempotency_key: Optional[str] = None) -> AnsweredResistance:
        """Compute one resistance: ``POST /resistance``."""
        return _read("AnsweredResistance", self.call("POST", "/resistance", body=body, headers={"Idempotency-Key": idempotency_key or _new_idempotency_key()}))

    def read_resistance(self, shape: str, *, material: Any = None, resistivity: Any = None, conductivity: Any = None, sheet_resistance: Any = None, thickness: Any = None, extrapolate: Any = None, temperature: Any = None, voltage: Any = None, current: Any = None, power: Any = None, uncertainty: Any = None, trials: Any = None, seed: Any = None, include: Any = None, format: Any = None, **dimensions: Any) -> Union[AnsweredResistance, str]:
        """Compute one resistance by address: ``GET /resistance/{shape}``."""
        return _read("AnsweredResistance", self.call("GET", f"/resistance/{urllib.parse.quote(shape, safe='')}", query={"material": material, "resistivity": resistivity, "conductivity": conductivity, "sheetResistance": sheet_resistance, "thickness": thickness, "extrapolate": extrapolate, "temperature": temperature, "voltage": voltage, "current": current, "power": power, "uncertainty": uncertainty, "trials": trials, "seed": seed, "include": include, "format": format, **{_api_name(name): value for name, value in dimensions.items()}}))

    def size_dimension(self, body: Any, *, idempotency_key: Optional[str] = None) -> AnsweredSizing:
        """Find the dimension that gives a resistance: ``POST /sizing``."""
        return _read("AnsweredSizing", self.call("POST", "/sizing", body=body, headers={"Idempotency-Key": idempotency_key or _new_idempotency_key()}))

    def compute_batch(self, body: Union[Mapping[str, Any], str, Any], *, format: Any = None) -> Union[BatchAnswer, str]:
        """Compute up to 10,000 resistances: ``POST /resistance/batch``."""
        return _read("BatchAnswer", self.call("POST", "/resistance/batch", query={"format": format}, body=body, headers={"Content-Type": "text/csv" if isinstance(body, str) else "application/json"}, timeout=_BATCH_SECONDS, repeatable=True))

    def solve_network(self, body: Any, *, idempotency_key: Optional[str] = None) -> AnsweredNetwork:
        """Solve a network of resistances: ``POST /networks``."""
        return _read("AnsweredNetwork", self.call("POST", "/networks", body=body, headers={"Idempotency-Key": idempotency_key or _new_idempotency_key()}))

    def store_outline(self, body: Any, *, idempotency_key: Optional[str] = None) -> Outline:
        """Store an outline: ``POST /outlines``."""
        return _read("Outline", self.call("POST", "/outlines", body=body, headers={"Idempotency-Key": idempotency_key or _new_idempotency_key()}))

    def read_outline(self, id: str) -> Outline:
        """Read a stored outline: ``GET /outlines/{id}``."""
        return _read("Outline", self.call("GET", f"/outlines/{urllib.parse.quote(id, safe='')}"))

    def solve_field(self, body: Any, *, idempotency_key: Optional[str] = None, wait: Optional[int] = None) -> Field:
        """Solve the field on an outline: ``POST /fields``."""
        return _read("Field", self.call("POST", "/fields", body=body, headers={"Idempotency-Key": idempotency_key or _new_idempotency_key(), "Prefer": None if wait is None else f"wait={wait}"}, timeout=None if wait is None else max(self._timeout, wait + 15.0)))

    def read_field(self, id: str) -> Field:
        """Read a field solution: ``GET /fields/{id}``."""
        return _read("Field", self.call("GET", f"/fields/{urllib.parse.quote(id, safe='')}"))

    def delete_field(self, id: str) -> None:
        """Cancel or delete a field solution: ``DELETE /fields/{id}``."""
        return self.call("DELETE", f"/fields/{urllib.parse.quote(id, safe='')}")

    def read_field_map(self, id: str, *, lines: Any = None, resolution: Any = None) -> FieldMap:
        """Read a field solution's map: ``GET /fields/{id}/map.json``."""
        return _read("FieldMap", self.call("GET", f"/fields/{urllib.parse.quote(id, safe='')}/map.json", query={"lines": lines, "resolution": resolution}))

    def read_field_plot(self, id: str) -> str:
        """Read a field solution's picture: ``GET /fields/{id}/plot.svg``."""
        return self.call("GET", f"/fields/{urllib.parse.quote(id, safe='')}/plot.svg")

    def read_field_line(self, id: str, *, from_: Any, to: Any, samples: Any = None) -> FieldLine:
        """Read a field solution along a line: ``GET /fields/{id}/line``."""
        return _read("FieldLine", self.call("GET", f"/fields/{urllib.parse.quote(id, safe='')}/line", query={"from": from_, "to": to, "samples": samples}))

    def list_materials(self, *, limit: Any = None, cursor: Any = None, owner: Any = None) -> MaterialPage:
        """List materials: ``GET /materials``."""
        return _read("MaterialPage", self.call("GET", "/materials", query={"limit": limit, "cursor": cursor, "owner": owner}))

    def create_material(self, body: Union[Mapping[str, Any], str, Any], *, name: Any = None, kind: Any = None, source: Any = None, uncertainty: Any = None, idempotency_key: Optional[str] = None) -> Material:
        """Create a material of the team: ``POST /materials``."""
        return _read("Material", self.call("POST", "/materials", query={"name": name, "kind": kind, "source": source, "uncertainty": uncertainty}, body=body, headers={"Idempotency-Key": idempotency_key or _new_idempotency_key(), "Content-Type": "text/csv" if isinstance(body, str) else "application/json"}))

    def read_material(self, id: str, *, version: Any = None) -> Material:
        """Read a material: ``GET /materials/{id}``."""
        return _read("Material", self.call("GET", f"/materials/{urllib.parse.quote(id, safe='')}", query={"version": version}))

    def change_material(self, id: str, body: Any, *, if_match: str) -> Material:
        """Make the next version of a material: ``PATCH /materials/{id}``."""
        return _read("Material", self.call("PATCH", f"/materials/{urllib.parse.quote(id, safe='')}", body=body, headers={"If-Match": if_match}))

    def retire_material(self, id: str, *, if_match: Optional[str] = None) -> None:
        """Retire a material: ``DELETE /materials/{id}``."""
        return self.call("DELETE", f"/materials/{urllib.parse.quote(id, safe='')}", headers={"If-Match": if_match})

    def list_records(self, *, limit: Any = None, cursor: Any = None, operation: Any = None, shape: Any = None, search: Any = None) -> RecordPage:
        """List stored calculations: ``GET /records``."""
        return _read("RecordPage", self.call("GET", "/records", query={"limit": limit, "cursor": cursor, "operation": operation, "shape": shape, "search": search}))

    def read_record(self, id: str) -> Record:
        """Read a record: ``GET /records/{id}``."""
        return _read("Record", self.call("GET", f"/records/{urllib.parse.quote(id, safe='')}"))

    def relabel_record(self, id: str, body: Any) -> Record:
        """Relabel a record: ``PATCH /records/{id}``."""
        return _read("Record", self.call("PATCH", f"/records/{urllib.parse.quote(id, safe='')}", body=body))

    def delete_record(self, id: str) -> None:
        """Delete a record: ``DELETE /records/{id}``."""
        return self.call("DELETE", f"/records/{urllib.parse.quote(id, safe='')}")

    def replay_record(self, id: str, *, wait: Optional[int] = None) -> Union[Replay, Field]:
        """Replay a record: ``POST /records/{id}/replay``."""
        return _read(("any", ("Replay", "Field",)), self.call("POST", f"/records/{urllib.parse.quote(id, safe='')}/replay", headers={"Prefer": None if wait is None else f"wait={wait}"}, timeout=None if wait is None else max(self._timeout, wait + 15.0)))

    def list_keys(self, *, limit: Any = None, cursor: Any = None) -> KeyPage:
        """List the team's keys: ``GET /keys``."""
        return _read("KeyPage", self.call("GET", "/keys", query={"limit": limit, "cursor": cursor}))

    def issue_key(self, body: Any, *, idempotency_key: Optional[str] = None) -> IssuedKey:
        """Issue a key: ``POST /keys``."""
        return _read("IssuedKey", self.call("POST", "/keys", body=body, headers={"Idempotency-Key": idempotency_key}))

    def read_key(self, id: str) -> Key:
        """Read a key: ``GET /keys/{id}``."""
        return _read("Key", self.call("GET", f"/keys/{urllib.parse.quote(id, safe='')}"))

    def revoke_key(self, id: str) -> None:
        """Revoke a key: ``DELETE /keys/{id}``."""
        return self.call("DELETE", f"/keys/{urllib.parse.quote(id, safe='')}")

    def rotate_key(self, id: str, body: Any, *, idempotency_key: Optional[str] = None) -> RotatedKey:
        """Rotate a key: ``POST /keys/{id}/rotate``."""
        return _read("RotatedKey", self.call("POST", f"/keys/{urllib.parse.quote(id, safe='')}/rotate", body=body, headers={"Idempotency-Key": idempotency_key}))

    def read_usage(self) -> Usage:
        """What this key has used: ``GET /usage``."""
        return _read("Usage", self.call("GET", "/usage"))

    def read_open_api(self) -> ReadOpenApiAnswer:
        """This document: ``GET /openapi.json``."""
        return _read("ReadOpenApiAnswer", self.call("GET", "/openapi.json"))

    def read_health(self) -> Health:
        """Is the service there: ``GET /health``."""
        return _read("Health", self.call("GET", "/health"))


_OPERATIONS: Dict[str, Tuple[str, str, bool]] = {
    "listShapes": ("GET", "/shapes", False),
    "readShape": ("GET", "/shapes/{shape}", False),
    "computeResistance": ("POST", "/resistance", True),
    "readResistance": ("GET", "/resistance/{shape}", False),
    "sizeDimension": ("POST", "/sizing", True),
    "computeBatch": ("POST", "/resistance/batch", False),
    "solveNetwork": ("POST", "/networks", True),
    "storeOutline": ("POST", "/outlines", True),
    "readOutline": ("GET", "/outlines/{id}", False),
    "solveField": ("POST", "/fields", True),
    "readField": ("GET", "/fields/{id}", False),
    "deleteField": ("DELETE", "/fields/{id}", False),
    "readFieldMap": ("GET", "/fields/{id}/map.json", False),
    "readFieldPlot": ("GET", "/fields/{id}/plot.svg", False),
    "readFieldLine": ("GET", "/fields/{id}/line", False),
    "listMaterials": ("GET", "/materials", False),
    "createMaterial": ("POST", "/materials", True),
    "readMaterial": ("GET", "/materials/{id}", False),
    "changeMaterial": ("PATCH", "/materials/{id}", False),
    "retireMaterial": ("DELETE", "/materials/{id}", False),
    "listRecords": ("GET", "/records", False),
    "readRecord": ("GET", "/records/{id}", False),
    "relabelRecord": ("PATCH", "/records/{id}", False),
    "deleteRecord": ("DELETE", "/records/{id}", False),
    "replayRecord": ("POST", "/records/{id}/replay", False),
    "listKeys": ("GET", "/keys", False),
    "issueKey": ("POST", "/keys", False),
    "readKey": ("GET", "/keys/{id}", False),
    "revokeKey": ("DELETE", "/keys/{id}", False),
    "rotateKey": ("POST", "/keys/{id}/rotate", False),
    "readUsage": ("GET", "/usage", False),
    "readOpenApi": ("GET", "/openapi.json", False),
    "readHealth": ("GET", "/health", False),
}


# Hand-written: sdk/python/parts/client.py

#: Most items and bytes of one call for a batch; the service takes 10,000 and 20 MB.
_BATCH_ITEMS = 1000
_BATCH_BYTES = 8_000_000
_BATCH_SECONDS = 180.0
#: How often items are asked for again for which the service had no time.
_BATCH_ROUNDS = 5
_ENDED = frozenset(("done", "limited", "failed", "cancelled"))


class FieldJob:
    """A field solution under way: ``wait`` for its end, look at its ``progress``, or ``cancel`` it."""

    def __init__(self, client: "Client", field: Field) -> None:
        self._client = client
        #: What the service last said about it.
        self.field = field

    @property
    def id(self) -> str:
        return self.field.id

    @property
    def ended(self) -> bool:
        return self.field.status in _ENDED

    def refresh(self) -> Field:
        """Asks the service how far it is."""
        self.field = self._client.read_field(self.id)
        return self.field

    def wait(
        self,
        timeout: Optional[float] = None,
        on_progress: Optional[Callable[[FieldProgress], None]] = None,
        stop: Optional[threading.Event] = None,
        every: float = 0.5,
    ) -> Field:
        """
        Waits for the end and answers with it; "limited" and "failed" are ends too.

        :param timeout: seconds after which RhoformTimeout is raised; the solution goes on.
        :param on_progress: called with each new bracket, not before there is one.
        :param stop: once it is set, the solution is cancelled and RhoformStopped raised.
        """
        end = None if timeout is None else time.monotonic() + timeout
        told: Optional[FieldProgress] = None
        while True:
            if on_progress is not None and self.field.progress not in (None, told):
                told = self.field.progress
                on_progress(told)
            if self.ended:
                return self.field
            if stop is not None and stop.is_set():
                self.cancel()
                raise RhoformStopped(f"The field solution {self.id} was cancelled.")
            if end is not None and time.monotonic() >= end:
                raise RhoformTimeout(f"The field solution {self.id} did not end within {timeout:g} s.")
            if stop is not None:
                stop.wait(every)
            else:
                time.sleep(every)
            self.refresh()

    def cancel(self) -> None:
        """Cancels it; what it reserved of the month is given back. One that has ended stays as it is."""
        if not self.refresh().status in _ENDED:
            self._client.delete_field(self.id)
            self.refresh()


class Client(_Operations):
    """
    The client: one method an operation, and the few that do more.

    ``Client("https://rhoform.example", key=os.environ["RHOFORM_KEY"])``
    """

    def resistance(self, shape: _Shape, medium: Optional[Mapping[str, Any]] = None, **more: Any) -> AnsweredResistance:
        """
        Computes one resistance of a shape: ``resistance(Bar(length="1 m", ...), {"material": "copper-annealed"})``.

        :param more: further members of the request, such as ``operating``, ``include``, ``record``, ``media``.
        """
        return self.compute_resistance(request_of(shape, medium, **more))

    def batch(
        self, requests: Iterable[Any], on_progress: Optional[Callable[[int], None]] = None
    ) -> List[Union[AnsweredItem, RefusedItem]]:
        """
        Computes any number of requests, in as few calls as the limits allow, and answers in their order.

        Each item has its ``index`` among all requests and is an AnsweredItem with a ``result`` or a RefusedItem with a
        ``problem``. A request that is refused does not hinder the others.
        :param on_progress: called with the number of requests answered so far.
        """
        items: List[Union[AnsweredItem, RefusedItem, None]] = []
        chunk: List[Tuple[int, Any]] = []
        size = 0

        def flush() -> None:
            self._batch_chunk(chunk, items)
            chunk.clear()
            if on_progress is not None and items:
                on_progress(len(items))

        for index, request in enumerate(requests):
            plain = _plain(request)
            length = len(json.dumps(plain))
            if chunk and (len(chunk) >= _BATCH_ITEMS or size + length > _BATCH_BYTES):
                flush()
                size = 0
            items.append(None)
            chunk.append((index, plain))
            size += length
        if chunk:
            flush()
        return [item for item in items if item is not None]

    def _batch_chunk(self, chunk: Sequence[Tuple[int, Any]], items: List[Any]) -> None:
        left = list(chunk)
        for round_ in range(_BATCH_ROUNDS):
            body = {"items": [request for _, request in left]}
            # A batch stores nothing: a repeat does no harm.
            content = self.call("POST", "/resistance/batch", body=body, timeout=_BATCH_SECONDS, repeatable=True)
            answer = _read("BatchAnswer", content)
            late = []
            for (index, request), item in zip(left, answer.items):
                item = dataclasses.replace(item, index=index)
                items[index] = item
                if item.status == 503:
                    late.append((index, request))
            # Without a single answer the service is too slow for these: more rounds would not help.
            if not late or len(late) == len(left):
                return
            left = late

    def start_field(self, body: Any, **more: Any) -> FieldJob:
        """Starts a field solution: everything about the outline is checked at once, the rest runs as a job."""
        return FieldJob(self, self.solve_field(body, **more))

    def field(
        self,
        body: Any,
        timeout: Optional[float] = None,
        on_progress: Optional[Callable[[FieldProgress], None]] = None,
        stop: Optional[threading.Event] = None,
    ) -> Field:
        """
        Solves a field and waits for the end; an interrupt from the keyboard cancels the solution.

        :raises RhoformError: where it failed.
        """
        job = self.start_field(body)
        try:
            ended = job.wait(timeout, on_progress, stop)
        except KeyboardInterrupt:
            job.cancel()
            raise
        if ended.status == "failed":
            raise RhoformError(f"The field solution {ended.id} failed: {ended.failure}")
        return ended

    def pages(self, read: Callable[..., Any], **query: Any) -> Iterator[Any]:
        """All items of a list, page after page: ``client.pages(client.list_records, shape="bar")``."""
        cursor: Optional[str] = None
        while True:
            page = read(**query, cursor=cursor)
            for item in page.items:
                yield item
            cursor = page.next
            if cursor is None:
                return


def request_of(shape: _Shape, medium: Optional[Mapping[str, Any]] = None, **more: Any) -> Dict[str, Any]:
    """The request that a shape, a medium and further members make, as ``POST /resistance`` takes it."""
    request: Dict[str, Any] = {"shape": shape.SHAPE, "dimensions": _plain(shape)}
    if medium is not None:
        request["medium"] = _plain(medium)
    request.update({name: _plain(value) for name, value in more.items() if value is not None})
    return request


# Hand-written: sdk/python/parts/command.py

_USAGE = """usage: python -m rhoform COMMAND ... [--url URL]

  resistance SHAPE name=value ...   one resistance; the same names as in GET /resistance/{shape}
  shapes [SHAPE]                    the catalogue, or one shape's dimensions
  batch FILE.csv                    a table of requests; the answered table goes to the output
  field FILE.json                   a field solution; progress on the error output
  call OPERATION [name=value ...] [--body FILE]
                                    any operation of the API, such as listMaterials

The address comes from --url or RHOFORM_URL (else http://127.0.0.1:3000), the key from RHOFORM_KEY.
FILE may be - for the input. Exit code: 0 answered, 1 refused (of a table: a row) or not reached, 2 a mistake in the command."""


def _pairs(arguments: Sequence[str]) -> Dict[str, str]:
    pairs = {}
    for argument in arguments:
        name, equals, value = argument.partition("=")
        if not equals or not name:
            raise ValueError(f"{argument!r} is not of the form name=value.")
        pairs[name] = value
    return pairs


def _text_of(name: str) -> str:
    if name == "-":
        return sys.stdin.read()
    with open(name, encoding="utf-8-sig", newline="") as file:
        return file.read()


def _one_file(command: str, arguments: Sequence[str]) -> str:
    if len(arguments) != 1:
        raise ValueError(f"{command} needs one file, and was given {len(arguments)} arguments.")
    return arguments[0]


def _print_json(value: Any) -> None:
    print(json.dumps(_plain(value), indent=2, ensure_ascii=False))


def _print_shapes(client: Client, arguments: Sequence[str]) -> None:
    if not arguments:
        for shape in client.list_shapes().items:
            print(f"{shape.id:24} {shape.title}")
        return
    shape = client.read_shape(arguments[0])
    print(f"{shape.id}: {shape.title}\n{shape.summary}\n")
    for dimension in shape.dimensions:
        print(f"  {dimension.name:20} {dimension.label}" + (f", {dimension.unit}" if dimension.unit else ""))


def _print_resistance(client: Client, arguments: Sequence[str]) -> None:
    if not arguments:
        raise ValueError("resistance needs a shape and its dimensions.")
    pairs = _pairs(arguments[1:])
    path = f"/resistance/{urllib.parse.quote(arguments[0], safe='')}"
    content = client.call("GET", path, query=pairs, headers={"Accept": "application/json"})
    if isinstance(content, str) or pairs.get("format") == "text":
        print(content)
        return
    answer = _read("AnsweredResistance", content)
    found = answer.resistance
    print(found.text)
    print(f"{found.lower!r} ... {found.upper!r} ohm, {'proved' if found.proved else 'not proved'} ({found.bounds_basis})")
    for caution in answer.cautions:
        print(f"caution: {caution}", file=sys.stderr)


def _refused_rows(table: str) -> int:
    text = table.lstrip("\ufeff")
    delimiter = max(",;\t", key=text.split("\n", 1)[0].count)
    rows = csv.DictReader(io.StringIO(text), delimiter=delimiter)
    return sum(1 for row in rows if row.get("status") not in (None, "", "200"))


def _solve(client: Client, arguments: Sequence[str]) -> None:
    name = _one_file("field", arguments)

    def show(bracket: FieldProgress) -> None:
        print(f"{bracket.lower:.9g} ... {bracket.upper:.9g} ohm", file=sys.stderr)

    _print_json(client.field(json.loads(_text_of(name)), on_progress=show))


def _call(client: Client, arguments: Sequence[str]) -> None:
    rest = list(arguments)
    body: Any = None
    if "--body" in rest:
        place = rest.index("--body")
        if place + 1 == len(rest):
            raise ValueError("--body needs a file.")
        body = json.loads(_text_of(rest[place + 1]))
        del rest[place : place + 2]
    operation = _OPERATIONS.get(rest[0] if rest else "")
    if operation is None:
        raise ValueError(f"call needs an operation: {', '.join(sorted(_OPERATIONS))}.")
    method, path, repeats = operation
    pairs = _pairs(rest[1:])
    for name in re.findall(r"\{(\w+)\}", path):
        if name not in pairs:
            raise ValueError(f"{rest[0]} needs {name}=...")
        path = path.replace(f"{{{name}}}", urllib.parse.quote(pairs.pop(name), safe=""))
    headers = {"Idempotency-Key": _new_idempotency_key()} if repeats else {}
    if "If-Match" in pairs:
        headers["If-Match"] = pairs.pop("If-Match")
    content = client.call(method, path, query=pairs, body=body, headers=headers)
    if isinstance(content, str):
        print(content)
    elif content is not None:
        _print_json(content)


def main(arguments: Optional[Sequence[str]] = None) -> int:
    """What ``python -m rhoform`` runs; answers with the exit code."""
    rest = list(sys.argv[1:] if arguments is None else arguments)
    for stream in (sys.stdout, sys.stderr):
        reconfigure = getattr(stream, "reconfigure", None)
        if reconfigure is not None:
            reconfigure(encoding="utf-8", errors="replace")
    url = os.environ.get("RHOFORM_URL") or "http://127.0.0.1:3000"
    try:
        if "--url" in rest:
            place = rest.index("--url")
            if place + 1 == len(rest):
                raise ValueError("--url needs an address.")
            url = rest[place + 1]
            del rest[place : place + 2]
        if not rest or rest[0] in ("-h", "--help", "help"):
            print(_USAGE)
            return 0 if rest else 2
        client = Client(url, key=os.environ.get("RHOFORM_KEY") or None)
        command, rest = rest[0], rest[1:]
        if command == "resistance":
            _print_resistance(client, rest)
        elif command == "shapes":
            _print_shapes(client, rest)
        elif command == "batch":
            name = _one_file("batch", rest)
            headers = {"Content-Type": "text/csv", "Accept": "text/csv"}
            table = client.call(
                "POST",
                "/resistance/batch",
                body=_text_of(name),
                headers=headers,
                timeout=_BATCH_SECONDS,
                repeatable=True,
            )
            sys.stdout.write(table)
            refused = _refused_rows(table)
            if refused:
                print(f"{refused} {'row was' if refused == 1 else 'rows were'} not answered.", file=sys.stderr)
                return 1
        elif command == "field":
            _solve(client, rest)
        elif command == "call":
            _call(client, rest)
        else:
            raise ValueError(f"There is no command {command!r}.")
        return 0
    except RhoformError as error:
        print(error, file=sys.stderr)
        return 1
    except (ValueError, IndexError, OSError) as error:
        print(f"{error}\n\n{_USAGE}", file=sys.stderr)
        return 2


if __name__ == "__main__":
    sys.exit(main())
