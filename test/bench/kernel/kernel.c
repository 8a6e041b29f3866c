/* The magnitude of a filter over many frequencies as a plain C loop: reads the task as numbers, prints median milliseconds of the processor and the mean of ln|H|. */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <time.h>

#define MOST 64

static int zero_count, pole_count;
static double zero_re[MOST], zero_im[MOST], pole_re[MOST], pole_im[MOST];

static void read_roots(int *count, double *re, double *im) {
  if (scanf("%d", count) != 1 || *count > MOST) exit(1);
  for (int i = 0; i < *count; i++)
    if (scanf("%lf %lf", &re[i], &im[i]) != 2) exit(1);
}

static double log_gain(double constant, double f) {
  double power = constant * constant;
  for (int i = 0; i < zero_count; i++) power *= zero_re[i] * zero_re[i] + (f - zero_im[i]) * (f - zero_im[i]);
  for (int i = 0; i < pole_count; i++) power /= pole_re[i] * pole_re[i] + (f - pole_im[i]) * (f - pole_im[i]);
  return 0.5 * log(power);
}

static int ascending(const void *a, const void *b) {
  double x = *(const double *)a, y = *(const double *)b;
  return (x > y) - (x < y);
}

static double now_ms(void) {
  struct timespec t;
  clock_gettime(CLOCK_PROCESS_CPUTIME_ID, &t);
  return 1e3 * t.tv_sec + 1e-6 * t.tv_nsec;
}

int main(void) {
  int count, rounds;
  double from, to, constant;
  if (scanf("%d %d %lf %lf %lf", &count, &rounds, &from, &to, &constant) != 5) return 1;
  read_roots(&zero_count, zero_re, zero_im);
  read_roots(&pole_count, pole_re, pole_im);
  double *f = malloc(count * sizeof *f), *out = malloc(count * sizeof *out), *times = malloc(rounds * sizeof *times);
  if (!f || !out || !times) return 1;
  for (int i = 0; i < count; i++) f[i] = pow(10, from + (to - from) * i / (count - 1));
  for (int round = 0; round < rounds; round++) {
    double start = now_ms();
    for (int i = 0; i < count; i++) out[i] = log_gain(constant, f[i]);
    times[round] = now_ms() - start;
  }
  double sum = 0;
  for (int i = 0; i < count; i++) sum += out[i];
  qsort(times, rounds, sizeof *times, ascending);
  printf("%.6f %.17g\n", times[rounds / 2], sum / count);
  return 0;
}
