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
