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
