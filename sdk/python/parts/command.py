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
