/* Skew rays through centred spherical surfaces in double precision: the native yardstick. Written for this project.
 *
 * gcc -O3 -march=native -fno-math-errno -fno-trapping-math -o c_kernel c_kernel.c -lm
 * ./c_kernel PRESCRIPTION SECONDS      one line per variant: name, ray-surfaces per second, checksum
 *
 * Formulas: general skew-ray transfer, sphere intersection and refraction with direction cosines
 * (D. P. Feder, J. Opt. Soc. Am. 41, 630, 1951), written again here; even aspheres by Newton steps
 * on the sag equation from the vertex plane. One division and two square roots a spherical surface.
 */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <time.h>

#define MAXS 64
#define RAYS 1024
#define BLOCK 128
#define NOVEC __attribute__((noinline, optimize("no-tree-vectorize")))

static int ns;
static double C[MAXS], T[MAXS], MU[MAXS];           /* curvature, distance from the last vertex, n/n' */
static int ASPH[MAXS];                              /* 1: conic and even terms below apply */
static double K[MAXS], A4[MAXS], A6[MAXS];
static double sx[RAYS], sy[RAYS], sz[RAYS], sl[RAYS], sm[RAYS], sn[RAYS];
static double x[RAYS], y[RAYS], z[RAYS], l[RAYS], m[RAYS], n[RAYS];

static void load(const char *path) {
  FILE *f = fopen(path, "r");
  char line[256];
  double c, t, a, b;
  if (!f) { perror(path); exit(1); }
  while (fgets(line, sizeof line, f))
    if (line[0] != '#' && sscanf(line, "%lf %lf %lf %lf", &c, &t, &a, &b) == 4) {
      C[ns] = c; T[ns] = t; MU[ns] = a / b;
      ASPH[ns] = ns % 8 == 2;                       /* four of the thirty, for the asphere variants */
      K[ns] = -0.6; A4[ns] = 2e-7; A6[ns] = -3e-10;
      ns++;
    }
  fclose(f);
}

static void start(void) {
  for (int i = 0; i < RAYS; i++) {
    double r = 8.0 * sqrt((i + 0.5) / RAYS), phi = i * 2.399963229728653;
    sl[i] = 0.139 * sin(i * 0.7548776662466927);
    sm[i] = 0.139 * sin(i * 0.5698402909980532);
    sx[i] = r * cos(phi); sy[i] = r * sin(phi); sz[i] = 0;
    sn[i] = sqrt(1 - sl[i] * sl[i] - sm[i] * sm[i]);
  }
}

#define SPHERE(X, Y, Z, L, M, N, c, t, mu) do {                                   \
    Z -= t;                                                                       \
    double e = -(X * L + Y * M + Z * N), mz = Z + e * N;                          \
    double q = c * (X * X + Y * Y + Z * Z - e * e) - 2 * mz;                      \
    double ci = sqrt(N * N - c * q), d = e + q / (N + ci);                        \
    X += d * L; Y += d * M; Z += d * N;                                           \
    double g = sqrt(1 - mu * mu * (1 - ci * ci)) - mu * ci, gc = g * c;           \
    L = mu * L - gc * X; M = mu * M - gc * Y; N = mu * N - gc * Z + g;            \
  } while (0)

/* Newton on F = z - sag(x,y) from the vertex plane; then refraction at the unit normal. */
static inline __attribute__((always_inline)) void asphere(double *X, double *Y, double *Z, double *L, double *M, double *N,
                                                          double c, double t, double mu, double k, double a4, double a6) {
  double d = -(*Z - t) / *N, x0 = *X, y0 = *Y, z0 = *Z - t, fx, fy, den, h = 0;
  for (int it = 0; it < 12; it++) {
    double px = x0 + d * *L, py = y0 + d * *M, pz = z0 + d * *N, r2 = px * px + py * py;
    double s = sqrt(1 - (1 + k) * c * c * r2);
    double sag = c * r2 / (1 + s) + r2 * r2 * (a4 + a6 * r2);
    h = c / s + r2 * (4 * a4 + 6 * a6 * r2);        /* (d sag / d r) / r */
    fx = -h * px; fy = -h * py;
    den = fx * *L + fy * *M + *N;
    double step = (pz - sag) / den;
    d -= step;
    if (fabs(step) < 1e-12) break;
  }
  *X = x0 + d * *L; *Y = y0 + d * *M; *Z = z0 + d * *N;
  double inv = 1 / sqrt(fx * fx + fy * fy + 1), ci = den * inv;
  double g = (sqrt(1 - mu * mu * (1 - ci * ci)) - mu * ci) * inv;
  *L = mu * *L + g * fx; *M = mu * *M + g * fy; *N = mu * *N + g;
}

static NOVEC void ray_by_ray(void) {
  for (int i = 0; i < RAYS; i++) {
    double X = sx[i], Y = sy[i], Z = sz[i], L = sl[i], M = sm[i], N = sn[i];
    for (int s = 0; s < ns; s++) { double c = C[s], t = T[s], mu = MU[s]; SPHERE(X, Y, Z, L, M, N, c, t, mu); }
    x[i] = X; y[i] = Y; z[i] = Z; l[i] = L; m[i] = M; n[i] = N;
  }
}

static void reset(int b) {
  for (int i = b; i < b + BLOCK; i++) { x[i] = sx[i]; y[i] = sy[i]; z[i] = sz[i]; l[i] = sl[i]; m[i] = sm[i]; n[i] = sn[i]; }
}

static NOVEC void surface_by_surface(void) {
  for (int b = 0; b < RAYS; b += BLOCK) {
    reset(b);
    for (int s = 0; s < ns; s++) {
      const double c = C[s], t = T[s], mu = MU[s];
      for (int i = b; i < b + BLOCK; i++) {
        double X = x[i], Y = y[i], Z = z[i], L = l[i], M = m[i], N = n[i];
        SPHERE(X, Y, Z, L, M, N, c, t, mu);
        x[i] = X; y[i] = Y; z[i] = Z; l[i] = L; m[i] = M; n[i] = N;
      }
    }
  }
}

static __attribute__((noinline)) void surface_by_surface_simd(void) {
  for (int b = 0; b < RAYS; b += BLOCK) {
    reset(b);
    for (int s = 0; s < ns; s++) {
      const double c = C[s], t = T[s], mu = MU[s];
#pragma GCC ivdep
      for (int i = b; i < b + BLOCK; i++) {
        double X = x[i], Y = y[i], Z = z[i], L = l[i], M = m[i], N = n[i];
        SPHERE(X, Y, Z, L, M, N, c, t, mu);
        x[i] = X; y[i] = Y; z[i] = Z; l[i] = L; m[i] = M; n[i] = N;
      }
    }
  }
}

static NOVEC void asphere_ray_by_ray(void) {
  for (int i = 0; i < RAYS; i++) {
    double X = sx[i], Y = sy[i], Z = sz[i], L = sl[i], M = sm[i], N = sn[i];
    for (int s = 0; s < ns; s++) {
      double c = C[s], t = T[s], mu = MU[s];
      if (ASPH[s]) asphere(&X, &Y, &Z, &L, &M, &N, c, t, mu, K[s], A4[s], A6[s]);
      else SPHERE(X, Y, Z, L, M, N, c, t, mu);
    }
    x[i] = X; y[i] = Y; z[i] = Z; l[i] = L; m[i] = M; n[i] = N;
  }
}

static NOVEC void asphere_surface_by_surface(void) {
  for (int b = 0; b < RAYS; b += BLOCK) {
    reset(b);
    for (int s = 0; s < ns; s++) {
      const double c = C[s], t = T[s], mu = MU[s];
      if (ASPH[s])
        for (int i = b; i < b + BLOCK; i++) asphere(&x[i], &y[i], &z[i], &l[i], &m[i], &n[i], c, t, mu, K[s], A4[s], A6[s]);
      else
        for (int i = b; i < b + BLOCK; i++) SPHERE(x[i], y[i], z[i], l[i], m[i], n[i], c, t, mu);
    }
  }
}

static double now(void) { struct timespec t; clock_gettime(CLOCK_MONOTONIC, &t); return t.tv_sec + 1e-9 * t.tv_nsec; }

static void measure(const char *name, void (*f)(void), double seconds) {
  long runs = 0;
  double t0, dt, sum = 0;
  f();
  t0 = now();
  do { for (int r = 0; r < 10; r++) f(); runs += 10; } while ((dt = now() - t0) < seconds);
  for (int i = 0; i < RAYS; i++) sum += x[i] + 10 * m[i];
  printf("%s %.6e %.12e\n", name, (double)runs * RAYS * ns / dt, sum);
}

int main(int argc, char **argv) {
  double seconds = argc > 2 ? atof(argv[2]) : 0.3;
  load(argc > 1 ? argv[1] : "prescription.txt");
  start();
  measure("c_ray_by_ray", ray_by_ray, seconds);
  measure("c_surface_by_surface", surface_by_surface, seconds);
  measure("c_surface_by_surface_simd", surface_by_surface_simd, seconds);
  measure("c_asphere_ray_by_ray", asphere_ray_by_ray, seconds);
  measure("c_asphere_surface_by_surface", asphere_surface_by_surface, seconds);
  return 0;
}
