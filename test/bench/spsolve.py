"""Solves one matrix with scipy each time a line arrives, and answers with the seconds that took.

Arguments: a file of raw little-endian numbers (int32: size, entries; int32: column starts, rows; float64: values, right
side; lower triangle by columns), and a file to write the solution to. The line is `spsolve` or an ordering of `splu`.
"""
import sys
import time

import numpy
import scipy.sparse
import scipy.sparse.linalg

source, target = sys.argv[1:3]
raw = open(source, "rb").read()
size, entries = numpy.frombuffer(raw, numpy.int32, 2)
starts = numpy.frombuffer(raw, numpy.int32, size + 1, 8)
rows = numpy.frombuffer(raw, numpy.int32, entries, 8 + 4 * (size + 1))
offset = 8 + 4 * (size + 1) + 4 * entries
values = numpy.frombuffer(raw, numpy.float64, entries, offset)
rhs = numpy.frombuffer(raw, numpy.float64, size, offset + 8 * entries)
lower = scipy.sparse.csc_matrix((values, rows, starts), shape=(size, size))
matrix = scipy.sparse.csc_matrix(lower + scipy.sparse.tril(lower, -1).T)
matrix.sort_indices()

for line in sys.stdin:
    method = line.strip()
    begin = time.perf_counter()
    if method == "spsolve":
        solution = scipy.sparse.linalg.spsolve(matrix, rhs)
    else:
        solution = scipy.sparse.linalg.splu(matrix, permc_spec=method).solve(rhs)
    seconds = time.perf_counter() - begin
    solution.tofile(target)
    print(seconds, flush=True)
