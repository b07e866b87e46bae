/* Times CHOLMOD on one matrix: order, supernodal factor, 50 solves. See README.md beside this file.
   usage: cholmod_reference FILE.mtx amd|metis [GROUP]
   GROUP (say 6): the graph of groups of that many consecutive unknowns is ordered instead of that of the unknowns. */
#include <cholmod.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <time.h>

/* With one thread its own processor time, so that what else runs on the machine does not count. */
static double now(void) {
    struct timespec t;
    const char *threads = getenv("OPENBLAS_NUM_THREADS");
    clock_gettime(threads && !strcmp(threads, "1") ? CLOCK_PROCESS_CPUTIME_ID : CLOCK_MONOTONIC, &t);
    return t.tv_sec + 1e-9 * t.tv_nsec;
}

/* The order of all unknowns from that of their groups. */
static int *group_order(cholmod_sparse *a, int group, cholmod_common *c) {
    int n = (int)a->nrow, m = n / group, *ap = a->p, *ai = a->i;
    cholmod_triplet *t = cholmod_allocate_triplet(m, m, a->nzmax, -1, CHOLMOD_REAL, c);
    int *ti = t->i, *tj = t->j; double *tx = t->x;
    for (int j = 0; j < n; j++)
        for (int p = ap[j]; p < ap[j + 1]; p++) {
            int r = ai[p] / group, s = j / group;
            ti[t->nnz] = r > s ? r : s; tj[t->nnz] = r > s ? s : r; tx[t->nnz++] = r == s ? 100 : -1;
        }
    cholmod_sparse *g = cholmod_triplet_to_sparse(t, 0, c);
    cholmod_factor *f = cholmod_analyze(g, c);
    int *perm = malloc(sizeof(int) * n), *gp = f->Perm;
    for (int k = 0; k < m; k++)
        for (int d = 0; d < group; d++) perm[k * group + d] = gp[k] * group + d;
    cholmod_free_factor(&f, c); cholmod_free_sparse(&g, c); cholmod_free_triplet(&t, c);
    return perm;
}

int main(int argc, char **argv) {
    if (argc < 3) return 2;
    cholmod_common c;
    cholmod_start(&c);
    c.supernodal = CHOLMOD_SUPERNODAL;
    c.nmethods = 1;
    c.method[0].ordering = strcmp(argv[2], "metis") ? CHOLMOD_AMD : CHOLMOD_METIS;
    c.postorder = 1;
    FILE *in = fopen(argv[1], "r");
    cholmod_sparse *a = cholmod_read_sparse(in, &c);
    fclose(in);
    double order = 1e9, factor = 1e9, solve = 1e9;
    double ones[2] = {1, 0};
    size_t n = a->nrow;
    cholmod_dense *b = cholmod_ones(n, 50, CHOLMOD_REAL, &c);
    cholmod_factor *f = NULL;
    for (int repeat = 0; repeat < 3; repeat++) {
        double t0 = now();
        if (f) cholmod_free_factor(&f, &c);
        int *perm = argc > 3 ? group_order(a, atoi(argv[3]), &c) : NULL;
        int kept = c.method[0].ordering;
        if (perm) { c.method[0].ordering = CHOLMOD_GIVEN; f = cholmod_analyze_p(a, perm, NULL, 0, &c); c.method[0].ordering = kept; }
        else f = cholmod_analyze(a, &c);
        free(perm);
        double t1 = now();
        cholmod_factorize(a, f, &c);
        double t2 = now();
        cholmod_dense *x = cholmod_solve(CHOLMOD_A, f, b, &c);
        double t3 = now();
        if (t1 - t0 < order) order = t1 - t0;
        if (t2 - t1 < factor) factor = t2 - t1;
        if (t3 - t2 < solve) solve = t3 - t2;
        if (repeat == 2) {
            cholmod_dense *r = cholmod_copy_dense(b, &c);
            double minus[2] = {-1, 0};
            cholmod_sdmult(a, 0, minus, ones, x, r, &c);
            printf("%s %s%s order %.4f factor %.4f solve50 %.4f nonzeros %.0f flops %.4g residual %.2g\n", argv[1], argv[2],
                   argc > 3 ? " groups" : "", order, factor, solve, c.lnz, c.fl, cholmod_norm_dense(r, 0, &c));
            cholmod_free_dense(&r, &c);
        }
        cholmod_free_dense(&x, &c);
    }
    return c.status != CHOLMOD_OK;
}
