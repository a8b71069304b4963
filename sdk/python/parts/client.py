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
