/**
 * Coefficients of the explicit Runge–Kutta pair of Dormand and Prince of order 8(5,3), and of its dense
 * output of order 7, as published with the code DOP853 of Hairer, Nørsett and Wanner. Rows and columns are
 * numbered from 1: `c4` is the node of stage 4, `a43` the weight of stage 3 in it. Weights that are
 * zero are left out. Stage 13 is the slope at the end of the step, 14 to 16 serve the dense output only.
 *
 * @source [HairerNorsettWanner1993], section II.10; the tests check order conditions and observed order
 */

// Nodes.
export const c2 = 0.05260015195876773;
export const c3 = 0.0789002279381516;
export const c4 = 0.1183503419072274;
export const c5 = 0.2816496580927726;
export const c6 = 0.3333333333333333;
export const c7 = 0.25;
export const c8 = 0.3076923076923077;
export const c9 = 0.6512820512820513;
export const c10 = 0.6;
export const c11 = 0.8571428571428571;
export const c12 = 1.0;
export const c14 = 0.1;
export const c15 = 0.2;
export const c16 = 0.7777777777777778;

// Stage 2.
export const a2_1 = 0.05260015195876773;

// Stage 3.
export const a3_1 = 0.0197250569845379;
export const a3_2 = 0.0591751709536137;

// Stage 4.
export const a4_1 = 0.02958758547680685;
export const a4_3 = 0.08876275643042054;

// Stage 5.
export const a5_1 = 0.2413651341592667;
export const a5_3 = -0.8845494793282861;
export const a5_4 = 0.924834003261792;

// Stage 6.
export const a6_1 = 0.037037037037037035;
export const a6_4 = 0.17082860872947386;
export const a6_5 = 0.12546768756682242;

// Stage 7.
export const a7_1 = 0.037109375;
export const a7_4 = 0.17025221101954405;
export const a7_5 = 0.06021653898045596;
export const a7_6 = -0.017578125;

// Stage 8.
export const a8_1 = 0.03709200011850479;
export const a8_4 = 0.17038392571223998;
export const a8_5 = 0.10726203044637328;
export const a8_6 = -0.015319437748624402;
export const a8_7 = 0.008273789163814023;

// Stage 9.
export const a9_1 = 0.6241109587160757;
export const a9_4 = -3.3608926294469414;
export const a9_5 = -0.868219346841726;
export const a9_6 = 27.59209969944671;
export const a9_7 = 20.154067550477894;
export const a9_8 = -43.48988418106996;

// Stage 10.
export const a10_1 = 0.47766253643826434;
export const a10_4 = -2.4881146199716677;
export const a10_5 = -0.590290826836843;
export const a10_6 = 21.230051448181193;
export const a10_7 = 15.279233632882423;
export const a10_8 = -33.28821096898486;
export const a10_9 = -0.020331201708508627;

// Stage 11.
export const a11_1 = -0.9371424300859873;
export const a11_4 = 5.186372428844064;
export const a11_5 = 1.0914373489967295;
export const a11_6 = -8.149787010746927;
export const a11_7 = -18.52006565999696;
export const a11_8 = 22.739487099350505;
export const a11_9 = 2.4936055526796523;
export const a11_10 = -3.0467644718982196;

// Stage 12.
export const a12_1 = 2.273310147516538;
export const a12_4 = -10.53449546673725;
export const a12_5 = -2.0008720582248625;
export const a12_6 = -17.9589318631188;
export const a12_7 = 27.94888452941996;
export const a12_8 = -2.8589982771350235;
export const a12_9 = -8.87285693353063;
export const a12_10 = 12.360567175794303;
export const a12_11 = 0.6433927460157636;

// Stage 14.
export const a14_1 = 0.056167502283047954;
export const a14_7 = 0.25350021021662483;
export const a14_8 = -0.2462390374708025;
export const a14_9 = -0.12419142326381637;
export const a14_10 = 0.15329179827876568;
export const a14_11 = 0.00820105229563469;
export const a14_12 = 0.007567897660545699;
export const a14_13 = -0.008298;

// Stage 15.
export const a15_1 = 0.03183464816350214;
export const a15_6 = 0.028300909672366776;
export const a15_7 = 0.053541988307438566;
export const a15_8 = -0.05492374857139099;
export const a15_11 = -0.00010834732869724932;
export const a15_12 = 0.0003825710908356584;
export const a15_13 = -0.00034046500868740456;
export const a15_14 = 0.1413124436746325;

// Stage 16.
export const a16_1 = -0.42889630158379194;
export const a16_6 = -4.697621415361164;
export const a16_7 = 7.683421196062599;
export const a16_8 = 4.06898981839711;
export const a16_9 = 0.3567271874552811;
export const a16_13 = -0.0013990241651590145;
export const a16_14 = 2.9475147891527724;
export const a16_15 = -9.15095847217987;

// Weights of the solution of order 8.
export const b1 = 0.054293734116568765;
export const b6 = 4.450312892752409;
export const b7 = 1.8915178993145003;
export const b8 = -5.801203960010585;
export const b9 = 0.3111643669578199;
export const b10 = -0.1521609496625161;
export const b11 = 0.20136540080403034;
export const b12 = 0.04471061572777259;

// Weights of its differences from the solutions of order 5 and 3, whose mixture is the error estimate.
export const fifth1 = 0.01312004499419488;
export const fifth6 = -1.2251564463762044;
export const fifth7 = -0.4957589496572502;
export const fifth8 = 1.6643771824549864;
export const fifth9 = -0.35032884874997366;
export const fifth10 = 0.3341791187130175;
export const fifth11 = 0.08192320648511571;
export const fifth12 = -0.022355307863886294;
export const third1 = -0.18980075407240762;
export const third6 = 4.450312892752409;
export const third7 = 1.8915178993145003;
export const third8 = -5.801203960010585;
export const third9 = -0.4226823213237919;
export const third10 = -0.1521609496625161;
export const third11 = 0.20136540080403034;
export const third12 = 0.02265179219836082;

// Weights of the four highest terms of the dense output.
export const d4_1 = -8.428938276109013;
export const d4_6 = 0.5667149535193777;
export const d4_7 = -3.0689499459498917;
export const d4_8 = 2.38466765651207;
export const d4_9 = 2.117034582445028;
export const d4_10 = -0.871391583777973;
export const d4_11 = 2.2404374302607883;
export const d4_12 = 0.6315787787694688;
export const d4_13 = -0.08899033645133331;
export const d4_14 = 18.148505520854727;
export const d4_15 = -9.194632392478356;
export const d4_16 = -4.436036387594894;
export const d5_1 = 10.427508642579134;
export const d5_6 = 242.28349177525817;
export const d5_7 = 165.20045171727028;
export const d5_8 = -374.5467547226902;
export const d5_9 = -22.113666853125306;
export const d5_10 = 7.733432668472264;
export const d5_11 = -30.674084731089398;
export const d5_12 = -9.332130526430229;
export const d5_13 = 15.697238121770845;
export const d5_14 = -31.139403219565178;
export const d5_15 = -9.35292435884448;
export const d5_16 = 35.81684148639408;
export const d6_1 = 19.985053242002433;
export const d6_6 = -387.0373087493518;
export const d6_7 = -189.17813819516758;
export const d6_8 = 527.8081592054236;
export const d6_9 = -11.57390253995963;
export const d6_10 = 6.8812326946963;
export const d6_11 = -1.0006050966910838;
export const d6_12 = 0.7777137798053443;
export const d6_13 = -2.778205752353508;
export const d6_14 = -60.19669523126412;
export const d6_15 = 84.32040550667716;
export const d6_16 = 11.99229113618279;
export const d7_1 = -25.69393346270375;
export const d7_6 = -154.18974869023643;
export const d7_7 = -231.5293791760455;
export const d7_8 = 357.6391179106141;
export const d7_9 = 93.40532418362432;
export const d7_10 = -37.45832313645163;
export const d7_11 = 104.0996495089623;
export const d7_12 = 29.8402934266605;
export const d7_13 = -43.53345659001114;
export const d7_14 = 96.32455395918828;
export const d7_15 = -39.17726167561544;
export const d7_16 = -149.72683625798564;
