/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 *
 * Solves one of the benchmark problems by CVODE (SUNDIALS 6):
 *
 *   cvode_peer PROBLEM TOLERANCE RUNS
 *
 * Prints the processor seconds of the best of so many runs, fewer where they take long, then the values at the end, row by row. The problems are
 * those of PeerProblem.java, number for number. Columns are stacked into one system. Problems that are not stiff take
 * Adams methods with fixed-point iteration; stiff ones take BDF: a tridiagonal one with a banded matrix, and the
 * network with one factorisation of I - gamma A that serves all columns.
 */
#include <cvode/cvode.h>
#include <math.h>
#include <nvector/nvector_serial.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sundials/sundials_linearsolver.h>
#include <sundials/sundials_nonlinearsolver.h>
#include <sunlinsol/sunlinsol_band.h>
#include <sunmatrix/sunmatrix_band.h>
#include <sunnonlinsol/sunnonlinsol_fixedpoint.h>
#include <time.h>

#define PI 3.14159265358979323846

static int n, m, forced;
static double t_end;
static double *matrix, *push, *start;
static int *row_start, *columns;
static char problem[8];

static long long seed;
static double unit(void) {
  seed = (1103515245LL * seed + 12345) % 2147483648LL;
  return seed / 2147483648.0;
}

static double a0[16], a1[16], a2[16];
static double capacity[60], conductance[120], phase[120], heat[60];

/* Writes A at the pattern's entries; the array is n by n. */
static void write_matrix(double t) {
  double *a = matrix;
  if (problem[0] != 'P') return;
  switch (problem[1]) {
    case '1':
      for (int e = 0; e < 16; e++) a[e] = a0[e] + a1[e] * sin(t) + a2[e] * cos(2 * t);
      break;
    case '2':
      memset(a, 0, sizeof(double) * n * n);
      for (int e = 0; e < 120; e++) {
        int i = e % 60, j = e < 60 ? (i + 1) % 60 : (i + 7) % 60;
        double g = conductance[e] * (1 + 0.5 * sin(2 * PI * t / 10 + phase[e]));
        a[i * n + i] -= g / capacity[i];
        a[i * n + j] += g / capacity[i];
        a[j * n + j] -= g / capacity[j];
        a[j * n + i] += g / capacity[j];
      }
      for (int i = 0; i < n; i += 10) a[i * n + i] -= 0.05 / capacity[i];
      break;
    case '3': {
      double h = 1.0 / 401, swing = 0.5 * sin(2 * PI * t);
      for (int i = 0; i < n; i++) {
        double x = (i + 1) * h;
        double left = 1 + swing * cos(PI * (x - h / 2)), right = 1 + swing * cos(PI * (x + h / 2));
        a[i * n + i] = -(left + right) / (h * h) - 5 * (1 + sin(3 * x) * cos(t));
        if (i > 0) a[i * n + i - 1] = left / (h * h);
        if (i < n - 1) a[i * n + i + 1] = right / (h * h);
      }
      break;
    }
    case '4':
      for (int i = 0; i < 20; i++) a[(20 + i) * n + i] = -(1 + 0.02 * i + 0.3 * cos(2 * t) + 0.6);
      break;
    default:
      a[4] = -1000 * (1 + 0.1 * sin(t / 2));
      a[14] = -1010 * (1 + 0.1 * cos(t / 3));
  }
}

static void write_push(double t) {
  if (problem[1] == '2') {
    double outside = 20 + 10 * sin(2 * PI * t / 24);
    for (int i = 0; i < n; i++)
      push[i] = ((i % 10 == 0 ? 0.05 : 0) * outside + heat[i] * (1 + cos(t))) / capacity[i];
  } else {
    for (int i = 0; i < n; i++) {
      double x = (i + 1) / 401.0 - 0.5;
      push[i] = 10 * exp(-50 * x * x) * (1 + sin(2 * PI * t));
    }
  }
}

static int rhs(realtype t, N_Vector y, N_Vector ydot, void *data) {
  double *x = N_VGetArrayPointer(y), *d = N_VGetArrayPointer(ydot);
  (void)data;
  write_matrix(t);
  if (forced) write_push(t);
  for (int i = 0; i < n; i++) {
    double *out = d + i * m;
    for (int j = 0; j < m; j++) out[j] = forced ? push[i] : 0;
    for (int p = row_start[i]; p < row_start[i + 1]; p++) {
      double f = matrix[i * n + columns[p]];
      double *in = x + columns[p] * m;
      for (int j = 0; j < m; j++) out[j] += f * in[j];
    }
  }
  return 0;
}

static int band_jacobian(realtype t, N_Vector y, N_Vector fy, SUNMatrix jac, void *data, N_Vector w1, N_Vector w2,
                         N_Vector w3) {
  (void)y; (void)fy; (void)data; (void)w1; (void)w2; (void)w3;
  write_matrix(t);
  for (int i = 0; i < n; i++)
    for (int p = row_start[i]; p < row_start[i + 1]; p++)
      SM_ELEMENT_B(jac, i, columns[p]) = matrix[i * n + columns[p]];
  return 0;
}

/* One factorisation of I - gamma A for all columns, as a linear solver without a matrix of SUNDIALS. */
static double *lu;
static int *pivots;
static void *cvode;

static SUNLinearSolver_Type solver_type(SUNLinearSolver s) { (void)s; return SUNLINEARSOLVER_MATRIX_EMBEDDED; }

static int solve_columns(SUNLinearSolver s, SUNMatrix unused, N_Vector x, N_Vector b, realtype tolerance) {
  static double factored_gamma = 0, factored_t = -1;
  realtype gamma, t;
  (void)s; (void)unused; (void)tolerance;
  CVodeGetCurrentGamma(cvode, &gamma);
  CVodeGetCurrentTime(cvode, &t);
  if (factored_t < 0 || fabs(gamma / factored_gamma - 1) > 1e-14 || t != factored_t) {
    write_matrix(t);
    for (int e = 0; e < n * n; e++) lu[e] = -gamma * matrix[e];
    for (int i = 0; i < n; i++) lu[i * n + i] += 1;
    for (int k = 0; k < n; k++) {
      int pivot = k;
      for (int i = k + 1; i < n; i++)
        if (fabs(lu[i * n + k]) > fabs(lu[pivot * n + k])) pivot = i;
      pivots[k] = pivot;
      if (pivot != k)
        for (int j = 0; j < n; j++) {
          double kept = lu[k * n + j];
          lu[k * n + j] = lu[pivot * n + j];
          lu[pivot * n + j] = kept;
        }
      for (int i = k + 1; i < n; i++) {
        double f = lu[i * n + k] /= lu[k * n + k];
        if (f != 0)
          for (int j = k + 1; j < n; j++) lu[i * n + j] -= f * lu[k * n + j];
      }
    }
    factored_gamma = gamma;
    factored_t = t;
  }
  double *v = N_VGetArrayPointer(x);
  memcpy(v, N_VGetArrayPointer(b), sizeof(double) * n * m);
  for (int k = 0; k < n; k++)
    if (pivots[k] != k)
      for (int j = 0; j < m; j++) {
        double kept = v[k * m + j];
        v[k * m + j] = v[pivots[k] * m + j];
        v[pivots[k] * m + j] = kept;
      }
  for (int i = 0; i < n; i++)
    for (int k = 0; k < i; k++) {
      double f = lu[i * n + k];
      if (f != 0)
        for (int j = 0; j < m; j++) v[i * m + j] -= f * v[k * m + j];
    }
  for (int i = n - 1; i >= 0; i--) {
    for (int k = i + 1; k < n; k++) {
      double f = lu[i * n + k];
      if (f != 0)
        for (int j = 0; j < m; j++) v[i * m + j] -= f * v[k * m + j];
    }
    double inverse = 1 / lu[i * n + i];
    for (int j = 0; j < m; j++) v[i * m + j] *= inverse;
  }
  return 0;
}

static void set_up(void) {
  int basis = strcmp(problem + 2, "phi") == 0;
  n = problem[1] == '1' || problem[1] == '6' ? 4 : problem[1] == '2' ? 60 : problem[1] == '3' ? 400 : 40;
  m = basis ? n : 1;
  forced = !basis && (problem[1] == '2' || problem[1] == '3');
  t_end = problem[1] == '2' ? 100 : problem[1] == '3' ? 5 : problem[1] == '4' ? (basis ? PI : 200 * PI) : 20;
  matrix = calloc((size_t)n * n, sizeof(double));
  push = calloc(n, sizeof(double));
  start = calloc((size_t)n * m, sizeof(double));
  lu = calloc((size_t)n * n, sizeof(double));
  pivots = calloc(n, sizeof(int));
  if (problem[1] == '1') {
    seed = 1;
    for (int e = 0; e < 16; e++) a0[e] = 2 * unit() - 1;
    for (int e = 0; e < 16; e++) a1[e] = 2 * unit() - 1;
    for (int e = 0; e < 16; e++) a2[e] = 2 * unit() - 1;
    for (int i = 0; i < 4; i++) a0[5 * i] -= 0.5;
  } else if (problem[1] == '2') {
    seed = 2;
    for (int i = 0; i < 60; i++) capacity[i] = pow(10, -1 + 2 * unit());
    for (int e = 0; e < 120; e++) {
      double u = unit();
      conductance[e] = e < 60 ? pow(10, -1 + 5 * u) : pow(10, -2 + 2 * u);
      phase[e] = 2 * PI * unit();
    }
    for (int i = 0; i < 60; i++) heat[i] = 5 * unit();
    for (int i = 0; i < 60; i++) start[basis ? 0 : i] = 15 + 10 * unit();
    if (basis) start[0] = 0;
  } else if (problem[1] == '3') {
    for (int i = 0; i < n; i++) start[i] = sin(PI * (i + 1) / 401.0);
  } else if (problem[1] == '4') {
    for (int i = 0; i < 20; i++) {
      int row = (20 + i) * n;
      matrix[i * n + 20 + i] = 1;
      matrix[row + 20 + i] = -2 * 0.005;
      if (i > 0) matrix[row + i - 1] = 0.3;
      if (i < 19) matrix[row + i + 1] = 0.3;
      if (!basis) start[i] = 1.0 / (1 + i);
    }
  } else {
    matrix[1] = 1000;
    matrix[6] = 5;
    matrix[11] = 1010;
    matrix[12] = 5;
    if (!basis) start[0] = start[2] = 1;
  }
  if (basis)
    for (int i = 0; i < n; i++) start[i * m + i] = 1;
  write_matrix(0.3);
  row_start = calloc(n + 1, sizeof(int));
  columns = calloc((size_t)n * n, sizeof(int));
  int count = 0;
  for (int i = 0; i < n; i++) {
    for (int j = 0; j < n; j++)
      if (matrix[i * n + j] != 0) columns[count++] = j;
    row_start[i + 1] = count;
  }
}

int main(int argc, char **argv) {
  if (argc != 4 || strlen(argv[1]) > 7) return 2;
  strcpy(problem, argv[1]);
  double tolerance = atof(argv[2]);
  SUNContext context;
  SUNContext_Create(NULL, &context);
  set_up();
  int runs = atoi(argv[3]);
  int stiff = problem[1] == '2' || problem[1] == '3';
  double best = 1e300, spent = 0;
  N_Vector y = N_VNew_Serial((sunindextype)n * m, context);
  for (int run = 0; run < runs && (run == 0 || spent < 3); run++) {
    memcpy(N_VGetArrayPointer(y), start, sizeof(double) * n * m);
    clock_t began = clock();
    cvode = CVodeCreate(stiff ? CV_BDF : CV_ADAMS, context);
    SUNMatrix band = NULL;
    SUNLinearSolver linear = NULL;
    SUNNonlinearSolver fixed = NULL;
    CVodeInit(cvode, rhs, 0, y);
    CVodeSStolerances(cvode, tolerance, tolerance);
    CVodeSetMaxNumSteps(cvode, 100000000);
    if (problem[1] == '3') {
      band = SUNBandMatrix(n, 1, 1, context);
      linear = SUNLinSol_Band(y, band, context);
      CVodeSetLinearSolver(cvode, linear, band);
      CVodeSetJacFn(cvode, band_jacobian);
    } else if (problem[1] == '2') {
      linear = SUNLinSolNewEmpty(context);
      linear->ops->gettype = solver_type;
      linear->ops->solve = solve_columns;
      CVodeSetLinearSolver(cvode, linear, NULL);
    } else {
      fixed = SUNNonlinSol_FixedPoint(y, 0, context);
      CVodeSetNonlinearSolver(cvode, fixed);
    }
    realtype t;
    CVodeSetStopTime(cvode, t_end);
    if (CVode(cvode, t_end, y, &t, CV_NORMAL) < 0) return 1;
    double seconds = (double)(clock() - began) / CLOCKS_PER_SEC;
    spent += seconds;
    if (seconds < best) best = seconds;
    CVodeFree(&cvode);
    if (linear) SUNLinSolFree(linear);
    if (fixed) SUNNonlinSolFree(fixed);
    if (band) SUNMatDestroy(band);
  }
  printf("%.9g\n", best);
  double *x = N_VGetArrayPointer(y);
  for (int e = 0; e < n * m; e++) printf("%.17g\n", x[e]);
  return 0;
}
