// The cascade bench in C++: the same ladder, the same law of each part, the same outputs, plain doubles, point by point.
// Arguments: runs, calls a run. Prints the median nanoseconds of one call, then |Γ| and gain of the last call.
#include <algorithm>
#include <chrono>
#include <cmath>
#include <cstdio>
#include <cstdlib>
#include <vector>

struct Part {
  bool series;
  double skin, inductance, elastance;
};

static const int points = 1001;
static double omega[points], root[points], loadV[2][points], magnitude[points], gain[points];
static std::vector<Part> ladder;

static Part part(bool series, bool coil, double value) {
  const double q = coil ? 40 : 180, at = 900e6, w = 2 * M_PI * at;
  const double x = coil ? w * value : 1 / (w * value);
  return {series, x / (q * std::sqrt(at)), coil ? value : 0.0, coil ? 0.0 : 1 / value};
}

static void evaluate() {
  const size_t count = ladder.size();
  for (int k = 0; k < points; k++) {
    const double w = omega[k], inverse = 1 / w, r = root[k];
    double vRe = loadV[0][k], vIm = loadV[1][k], iRe = 1, iIm = 0;
    for (size_t e = 0; e < count; e++) {
      const Part &p = ladder[e];
      const double re = p.skin * r, im = p.inductance * w - p.elastance * inverse;
      if (p.series) {
        vRe += re * iRe - im * iIm;
        vIm += re * iIm + im * iRe;
      } else {
        const double s = re * re + im * im, g = re / s, b = -im / s;
        iRe += g * vRe - b * vIm;
        iIm += g * vIm + b * vRe;
      }
    }
    const double bRe = vRe + 50 * iRe, bIm = vIm + 50 * iIm, tRe = vRe - 50 * iRe, tIm = vIm - 50 * iIm;
    const double bottom = bRe * bRe + bIm * bIm;
    magnitude[k] = std::sqrt((tRe * tRe + tIm * tIm) / bottom);
    gain[k] = 4 * 50 * loadV[0][k] / bottom;
  }
}

int main(int argc, char **argv) {
  const int runs = argc > 1 ? std::atoi(argv[1]) : 9, calls = argc > 2 ? std::atoi(argv[2]) : 500;
  for (int k = 0; k < points; k++) {
    const double f = 700e6 + 500e6 * k / (points - 1);
    omega[k] = 2 * M_PI * f;
    root[k] = std::sqrt(f);
    loadV[0][k] = 18;
    loadV[1][k] = -37 * 868e6 / f;
  }
  std::vector<double> times;
  for (int run = 0; run <= runs; run++) {
    const auto start = std::chrono::steady_clock::now();
    for (int call = 0; call < calls; call++) {
      // Other values each time, as a solver has them; the last call is that of the reference ladder.
      const double x = 1 + 1e-6 * (calls - 1 - call);
      ladder = {part(true, true, 6.8e-9 * x), part(false, false, 2.2e-12 * x), part(true, true, 4.7e-9 * x), part(false, false, 3.3e-12 * x),
                part(true, false, 22e-12 * x), part(false, true, 12e-9 * x), part(true, true, 3.9e-9 * x), part(false, false, 1.5e-12 * x)};
      evaluate();
    }
    const std::chrono::duration<double, std::nano> took = std::chrono::steady_clock::now() - start;
    if (run > 0) times.push_back(took.count() / calls);
  }
  std::sort(times.begin(), times.end());
  std::printf("%.17g\n", times[times.size() / 2]);
  for (int k = 0; k < points; k++) std::printf("%.17g %.17g\n", magnitude[k], gain[k]);
}
