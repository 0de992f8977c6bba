import { readMasterTable } from './master-table';

/*
 * The single-sampling master tables as a reader holds them against the printed pages: one row a code letter, its sample
 * size, then one cell for each AQL of the head line. A lone number is the acceptance number, with the next number as
 * rejection number; "0/2" names both; v and ^ are the printed arrows (first plan below, first plan above); a dot is blank.
 */

/**
 * Normal inspection, sample sizes in units.
 *
 * Source: MIL-STD-105E (10 May 1989), Table II-A; the same in ANSI/ASQ Z1.4, Table II-A.
 */
export const NORMAL_TABLE = readMasterTable(`
        .010 .015 .025 .040 .065  .10  .15  .25  .40  .65  1.0  1.5  2.5  4.0  6.5   10   15   25   40   65  100  150  250  400  650 1000
A    2     v    v    v    v    v    v    v    v    v    v    v    v    v    v    0    v    v    1    2    3    5    7   10   14   21   30
B    3     v    v    v    v    v    v    v    v    v    v    v    v    v    0    ^    v    1    2    3    5    7   10   14   21   30   44
C    5     v    v    v    v    v    v    v    v    v    v    v    v    0    ^    v    1    2    3    5    7   10   14   21   30   44    ^
D    8     v    v    v    v    v    v    v    v    v    v    v    0    ^    v    1    2    3    5    7   10   14   21   30   44    ^    ^
E   13     v    v    v    v    v    v    v    v    v    v    0    ^    v    1    2    3    5    7   10   14   21   30   44    ^    ^    ^
F   20     v    v    v    v    v    v    v    v    v    0    ^    v    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^
G   32     v    v    v    v    v    v    v    v    0    ^    v    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^    ^
H   50     v    v    v    v    v    v    v    0    ^    v    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^    ^    ^
J   80     v    v    v    v    v    v    0    ^    v    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^    ^    ^    ^
K  125     v    v    v    v    v    0    ^    v    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
L  200     v    v    v    v    0    ^    v    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
M  315     v    v    v    0    ^    v    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
N  500     v    v    0    ^    v    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
P  800     v    0    ^    v    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
Q 1250     0    ^    v    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
R 2000     ^    ^    1    2    3    5    7   10   14   21    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
`);

/**
 * Tightened inspection, sample sizes in units. Row S is reached only by the arrows at AQL 0.025.
 *
 * Source: MIL-STD-105E, Table II-B; the same in ANSI/ASQ Z1.4, Table II-B.
 */
export const TIGHTENED_TABLE = readMasterTable(`
        .010 .015 .025 .040 .065  .10  .15  .25  .40  .65  1.0  1.5  2.5  4.0  6.5   10   15   25   40   65  100  150  250  400  650 1000
A    2     v    v    v    v    v    v    v    v    v    v    v    v    v    v    v    v    v    v    1    2    3    5    8   12   18   27
B    3     v    v    v    v    v    v    v    v    v    v    v    v    v    v    0    v    v    1    2    3    5    8   12   18   27   41
C    5     v    v    v    v    v    v    v    v    v    v    v    v    v    0    v    v    1    2    3    5    8   12   18   27   41    ^
D    8     v    v    v    v    v    v    v    v    v    v    v    v    0    v    v    1    2    3    5    8   12   18   27   41    ^    ^
E   13     v    v    v    v    v    v    v    v    v    v    v    0    v    v    1    2    3    5    8   12   18   27   41    ^    ^    ^
F   20     v    v    v    v    v    v    v    v    v    v    0    v    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^
G   32     v    v    v    v    v    v    v    v    v    0    v    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^    ^
H   50     v    v    v    v    v    v    v    v    0    v    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^    ^    ^
J   80     v    v    v    v    v    v    v    0    v    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^    ^    ^    ^
K  125     v    v    v    v    v    v    0    v    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
L  200     v    v    v    v    v    0    v    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
M  315     v    v    v    v    0    v    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
N  500     v    v    v    0    v    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
P  800     v    v    0    v    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
Q 1250     v    0    v    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
R 2000     0    ^    v    1    2    3    5    8   12   18    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^    ^
S 3150     .    .    1    .    .    .    .    .    .    .    .    .    .    .    .    .    .    .    .    .    .    .    .    .    .    .
`);

/**
 * Reduced inspection, sample sizes in units, with the gap between acceptance and rejection number.
 *
 * Source: MIL-STD-105E, Table II-C; the same in ANSI/ASQ Z1.4, Table II-C.
 */
export const REDUCED_TABLE = readMasterTable(`
         .010  .015  .025  .040  .065   .10   .15   .25   .40   .65   1.0   1.5   2.5   4.0   6.5    10    15    25    40    65   100   150   250   400   650  1000
A    2      v     v     v     v     v     v     v     v     v     v     v     v     v     v     0     v     v     1     2     3     5     7    10    14    21    30
B    2      v     v     v     v     v     v     v     v     v     v     v     v     v     0     ^     v   0/2   1/3   2/4   3/5     5     7    10    14    21    30
C    2      v     v     v     v     v     v     v     v     v     v     v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13 14/17 21/24     ^
D    3      v     v     v     v     v     v     v     v     v     v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13 14/17 21/24     ^     ^
E    5      v     v     v     v     v     v     v     v     v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13 14/17 21/24     ^     ^     ^
F    8      v     v     v     v     v     v     v     v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^
G   13      v     v     v     v     v     v     v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^     ^
H   20      v     v     v     v     v     v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^     ^     ^
J   32      v     v     v     v     v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^     ^     ^     ^
K   50      v     v     v     v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^
L   80      v     v     v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^
M  125      v     v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^
N  200      v     v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^
P  315      v     0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^
Q  500      0     ^     v   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^
R  800      ^     ^   0/2   1/3   1/4   2/5   3/6   5/8  7/10 10/13     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^     ^
`);
