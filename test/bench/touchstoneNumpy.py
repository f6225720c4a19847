# Reads the file named first with numpy's own text reader and prints the least time of three readings in ms.
import sys, time
import numpy

least = float('inf')
for _ in range(3):
    start = time.perf_counter()
    table = numpy.loadtxt(sys.argv[1], comments=('#', '!'))
    least = min(least, (time.perf_counter() - start) * 1e3)
print(least, table.sum())
