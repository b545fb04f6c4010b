#!/usr/bin/env python3
"""A batch by Python's standard library: python3 batch.py http://localhost:5000 < tests.ndjson > answers.ndjson

Lines are sent while answers are taken, so that neither side waits for the other. If the connection breaks, the lines
that were answered are answered, and the rest is sent again: the service keeps nothing, so that nothing is done twice.
"""
import http.client
import json
import sys
import threading
import time
import urllib.parse

PATH = "/v1/moisture-density/batch"
ATTEMPTS = 5


def answers_of(service, lines):
    """Yields the answers of lines in order, as bytes without their line break, until all are there or the connection breaks."""
    address = urllib.parse.urlsplit(service)
    connection = http.client.HTTPConnection(address.hostname, address.port or 80)
    connection.putrequest("POST", PATH)
    connection.putheader("Content-Type", "application/x-ndjson")
    connection.putheader("Transfer-Encoding", "chunked")
    connection.endheaders()

    def send():
        try:
            for line in lines:
                body = line + b"\n"
                connection.send(b"%x\r\n%b\r\n" % (len(body), body))
            connection.send(b"0\r\n\r\n")
        except OSError:
            pass  # The reader meets the same broken connection, and says so.

    threading.Thread(target=send, daemon=True).start()
    try:
        response = connection.getresponse()
        if response.status != 200:
            raise SystemExit(response.read().decode())
        while line := response.readline():
            if not line.endswith(b"\n"):
                return  # Cut short: this answer does not count.
            yield line[:-1]
    finally:
        connection.close()


def is_stopping(answer):
    """Whether a service that is being stopped says that it read no further; only then has a problem the status 503."""
    return answer.startswith(b'{"type":"urn:drypeak:problem:unavailable"') and json.loads(answer)["status"] == 503


def main(service):
    # Blank lines have no answer: without them, answers and lines can be counted alike.
    lines = [line for line in (line.strip() for line in sys.stdin.buffer) if line]
    answered = attempts = 0
    while answered < len(lines):
        before = answered
        try:
            for answer in answers_of(service, lines[answered:]):
                if is_stopping(answer):
                    break
                sys.stdout.buffer.write(answer + b"\n")
                answered += 1
        except (OSError, http.client.HTTPException) as broken:
            print(f"{broken}; {answered} of {len(lines)} lines are answered", file=sys.stderr)
        attempts = attempts + 1 if answered == before else 0
        if attempts == ATTEMPTS:
            raise SystemExit(f"The service does not answer. Send the lines from {answered + 1} on again.")
        if answered < len(lines):
            time.sleep(attempts * 0.5)


if __name__ == "__main__":
    main(sys.argv[1])
