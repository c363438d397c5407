#include "planner/water/if97.h"

#include <array>
#include <cmath>

#include "planner/water/range_check.h"
#include "planner/water/saturation_line.h"

namespace lossline::water {
namespace {

/// Specific gas constant of water [J/(kg K)], [IF97] equation 1.
constexpr double R = 461.526;

struct Term {
  int i, j;
  double n;
};
struct IdealTerm {
  int j;
  double n;
};

// [IF97] Table 2: region 1, exponents I, J and coefficient n of equation 7.
constexpr std::array<Term, 34> liquid_terms{
    {{0, -2, 1.4632971213167e-1},     {0, -1, -8.4548187169114e-1},
     {0, 0, -3.756360367204},         {0, 1, 3.3855169168385},
     {0, 2, -9.5791963387872e-1},     {0, 3, 1.5772038513228e-1},
     {0, 4, -1.6616417199501e-2},     {0, 5, 8.1214629983568e-4},
     {1, -9, 2.8319080123804e-4},     {1, -7, -6.0706301565874e-4},
     {1, -1, -1.8990068218419e-2},    {1, 0, -3.2529748770505e-2},
     {1, 1, -2.1841717175414e-2},     {1, 3, -5.283835796993e-5},
     {2, -3, -4.7184321073267e-4},    {2, 0, -3.0001780793026e-4},
     {2, 1, 4.7661393906987e-5},      {2, 3, -4.4141845330846e-6},
     {2, 17, -7.2694996297594e-16},   {3, -4, -3.1679644845054e-5},
     {3, 0, -2.8270797985312e-6},     {3, 6, -8.5205128120103e-10},
     {4, -5, -2.2425281908e-6},       {4, -2, -6.5171222895601e-7},
     {4, 10, -1.4341729937924e-13},   {5, -8, -4.0516996860117e-7},
     {8, -11, -1.2734301741641e-9},   {8, -6, -1.7424871230634e-10},
     {21, -29, -6.8762131295531e-19}, {23, -31, 1.4478307828521e-20},
     {29, -38, 2.6335781662795e-23},  {30, -39, -1.1947622640071e-23},
     {31, -40, 1.8228094581404e-24},  {32, -41, -9.3537087292458e-26}}};

// [IF97] Table 10: region 2, ideal-gas part, equation 16.
constexpr std::array<IdealTerm, 9> vapour_ideal{{{0, -9.6927686500217},
                                                 {1, 1.0086655968018e1},
                                                 {-5, -5.608791128302e-3},
                                                 {-4, 7.1452738081455e-2},
                                                 {-3, -4.0710498223928e-1},
                                                 {-2, 1.4240819171444},
                                                 {-1, -4.383951131945},
                                                 {2, -2.8408632460772e-1},
                                                 {3, 2.1268463753307e-2}}};

// [IF97] Table 11: region 2, residual part, equation 17.
constexpr std::array<Term, 43> vapour_terms{
    {{1, 0, -1.7731742473213e-3},    {1, 1, -1.7834862292358e-2},    {1, 2, -4.5996013696365e-2},
     {1, 3, -5.7581259083432e-2},    {1, 6, -5.032527872793e-2},     {2, 1, -3.3032641670203e-5},
     {2, 2, -1.8948987516315e-4},    {2, 4, -3.9392777243355e-3},    {2, 7, -4.3797295650573e-2},
     {2, 36, -2.6674547914087e-5},   {3, 0, 2.0481737692309e-8},     {3, 1, 4.3870667284435e-7},
     {3, 3, -3.227767723857e-5},     {3, 6, -1.5033924542148e-3},    {3, 35, -4.0668253562649e-2},
     {4, 1, -7.8847309559367e-10},   {4, 2, 1.2790717852285e-8},     {4, 3, 4.8225372718507e-7},
     {5, 7, 2.2922076337661e-6},     {6, 3, -1.6714766451061e-11},   {6, 16, -2.1171472321355e-3},
     {6, 35, -2.3895741934104e1},    {7, 0, -5.905956432427e-18},    {7, 11, -1.2621808899101e-6},
     {7, 25, -3.8946842435739e-2},   {8, 8, 1.1256211360459e-11},    {8, 36, -8.2311340897998},
     {9, 13, 1.9809712802088e-8},    {10, 4, 1.0406965210174e-19},   {10, 10, -1.0234747095929e-13},
     {10, 14, -1.0018179379511e-9},  {16, 29, -8.0882908646985e-11}, {16, 50, 1.0693031879409e-1},
     {18, 57, -3.3662250574171e-1},  {20, 20, 8.9185845355421e-25},  {20, 35, 3.0629316876232e-13},
     {20, 48, -4.2002467698208e-6},  {21, 21, -5.9056029685639e-26}, {22, 53, 3.7826947613457e-6},
     {23, 39, -1.2768608934681e-15}, {24, 26, 7.3087610595061e-29},  {24, 40, 5.5414715350778e-17},
     {24, 58, -9.436970724121e-7}}};

double power(double base, int exponent) {
  double out = 1, square = exponent < 0 ? 1 / base : base;
  for (int e = std::abs(exponent); e > 0; e /= 2) {
    if (e % 2 == 1) out *= square;
    square *= square;
  }
  return out;
}

/// Pressure of the boundary between regions 2 and 3 [Pa], [IF97] equation 5 and Table 1.
double boundary_pressure(double T) {
  return 1e6 * (3.4805185628969e2 + T * (-1.1671859879975 + T * 1.0192970039326e-3));
}

double highest_vapour_pressure(double T) {
  if (T <= liquid_T_max) return saturation_line::pressure(T) * (1 + 1e-9);
  return T < 863.15 ? boundary_pressure(T) : water_p_max;
}

/// The liquid without range check.
PhaseState liquid(double T, double p) {
  const double x = 7.1 - p / 16.53e6, tau = 1386 / T, y = tau - 1.222;
  double by_pi = 0, by_tau = 0, by_tau2 = 0;
  for (const Term& t : liquid_terms) {
    const double xi = power(x, t.i), yj = power(y, t.j);
    by_pi -= t.n * t.i * xi / x * yj;
    by_tau += t.n * t.j * xi * yj / y;
    by_tau2 += t.n * t.j * (t.j - 1) * xi * yj / (y * y);
  }
  return {R * T * by_pi / 16.53e6, R * T * tau * by_tau, -R * tau * tau * by_tau2};
}

/// The vapour without range check.
PhaseState vapour(double T, double p) {
  const double pi = p / 1e6, tau = 540 / T, y = tau - 0.5;
  double by_pi = 1 / pi, by_tau = 0, by_tau2 = 0;
  for (const IdealTerm& t : vapour_ideal) {
    const double yj = power(tau, t.j);
    by_tau += t.n * t.j * yj / tau;
    by_tau2 += t.n * t.j * (t.j - 1) * yj / (tau * tau);
  }
  for (const Term& t : vapour_terms) {
    const double xi = power(pi, t.i);
    by_pi += t.n * t.i * xi / pi * power(y, t.j);
    if (t.j == 0) continue;  // y may be zero
    by_tau += t.n * t.j * xi * power(y, t.j - 1);
    if (t.j == 1) continue;
    by_tau2 += t.n * t.j * (t.j - 1) * xi * power(y, t.j - 2);
  }
  return {R * T * by_pi / 1e6, R * T * tau * by_tau, -R * tau * tau * by_tau2};
}

}  // namespace

double saturation_pressure(double T) {
  return saturation_line::pressure(
      checked("temperature", "K", T, saturation_T_min, saturation_T_max));
}

double saturation_temperature(double p) {
  return saturation_line::temperature(
      checked("pressure", "Pa", p, saturation_p_min, saturation_p_max));
}

PhaseState liquid_state(double T, double p) {
  checked("temperature of liquid water", "K", T, saturation_T_min, liquid_T_max);
  checked("pressure of liquid water", "Pa", p, saturation_line::pressure(T) * (1 - 1e-9),
          water_p_max);
  return liquid(T, p);
}

PhaseState vapour_state(double T, double p) {
  checked("temperature of steam", "K", T, saturation_T_min, vapour_T_max);
  // A pressure of zero is no state; a denormal one would overflow the volume.
  checked("pressure of steam", "Pa", p, 1e-9, highest_vapour_pressure(T));
  return vapour(T, p);
}

double saturated_liquid_enthalpy(double T) {
  checked("temperature", "K", T, saturation_T_min, liquid_T_max);
  return liquid(T, saturation_line::pressure(T)).enthalpy;
}

double saturated_vapour_enthalpy(double T) {
  checked("temperature", "K", T, saturation_T_min, liquid_T_max);
  return vapour(T, saturation_line::pressure(T)).enthalpy;
}

double latent_heat(double T) {
  return saturated_vapour_enthalpy(T) - saturated_liquid_enthalpy(T);
}

}  // namespace lossline::water
