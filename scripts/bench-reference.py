"""Times Python expressions for bench.mjs: one JSON request a line in, one JSON answer a line out.

{"setup": code, "call": expression} prepares a case; {"repeat": n} runs its call n times and answers the CPU milliseconds of one.
"""
import json
import sys
import time

names = {}
call = None
for line in sys.stdin:
    request = json.loads(line)
    if "setup" in request:
        names = {}
        exec(request["setup"], names)
        call = compile(request["call"], "call", "eval")
        answer = {"ready": True}
    else:
        started = time.process_time()
        for _ in range(request["repeat"]):
            eval(call, names)
        answer = {"cpuMs": (time.process_time() - started) * 1e3 / request["repeat"]}
    print(json.dumps(answer), flush=True)
