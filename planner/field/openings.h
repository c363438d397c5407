#pragma once
// What leaves a cavity through its openings: propagating channels, cut-off where it really exists,
// and an order-of-magnitude estimate of the power density outside.
//
// Sources
//   [Pozar]  D. M. Pozar, Microwave Engineering, 4th ed., Wiley 2012, sections 3.3 (rectangular)
//            and 3.4 (circular guide, TE11: p'_11 = 1.84118). From memory, textbook forms.
//   [Hill]   D. A. Hill, Electromagnetic Fields in Cavities, Wiley 2009, section 7.6: a matched
//            single-mode receiver takes S lambda^2/8 pi (from memory). One channel of an opening
//            is one such receiver; many channels make the area over 4 of geometrical optics.

namespace lossline::field {

/// Modes of a w x h opening that propagate: TE_mn with m + n > 0 and TM_mn with m, n > 0.
///
///   frequency      [Hz], > 0
///   width, height  [m], > 0
///   returns        0 or more; about 2 pi w h/lambda^2 for a large opening
///   throws         Error out_of_range
long long propagating_channels(double frequency, double width, double height);

/// Cross section of an opening for an isotropic field: power out = S times this.
///
///   passed_share  not sent back by a reflecting section or a neighbour, 0..1
///   returns       N lambda^2/(8 pi) passed_share [m2]; tends to w h/4. Against field solutions
///                 right within 7 % for a square opening, 20 % high for a slot a third of a
///                 wavelength low.
///   throws        Error out_of_range
double opening_cross_section(double frequency, double width, double height,
                             double passed_share = 1);

/// Whether a slot lets waves through whatever its height: wider than half a wavelength in what
/// fills it. The field that stands across the gap has no cut-off in the height.
///
///   filling  eps' of what fills the opening, >= 1
///   throws   Error out_of_range
bool wide_slot(double frequency, double width, double height, double filling = 1);

/// Attenuation of the least attenuated mode of an opening below cut-off.
///
///   returns  [dB/m]; 0 for a wide slot: cut-off then gives no protection at all. Ideal metal,
///            27.3 dB per width at low frequency
///   throws   Error out_of_range
double slot_attenuation(double frequency, double width, double height, double filling = 1);

/// The same for a round tube (TE11).
///
///   bore     inside diameter [m], > 0
///   returns  [dB/m]; 0 when the tube propagates; 32 dB per diameter at low frequency
///   throws   Error out_of_range
double tube_attenuation(double frequency, double bore, double filling = 1);

/// Power that leaves an end trap.
///
///   S               power density in front of it [W/m2], >= 0
///   channels_m2     opening_cross_section with nothing sent back [m2], >= 0
///   attenuation_dB  of the reflecting and absorbing sections together, >= 0
///   returns         [W]
///   throws          Error out_of_range
double leaving_power(double S, double channels_m2, double attenuation_dB);

/// An estimate of the power density outside an opening. Measure on site.
struct LeakEstimate {
  double mean = 0;     ///< over the surface at the distance [W/m2]
  double peak = 0;     ///< brightest speckle expected on it [W/m2]
  double low = 0;      ///< a tenth of the mean [W/m2]
  double high = 0;     ///< ten times the mean, and not below the peak [W/m2]
  double surface = 0;  ///< at the distance around the mouth [m2]
};

/// The power spread over the surface at a distance around the mouth of the opening,
/// w h + pi r (w + h) + 2 pi r^2, with the peak of n = surface/(lambda/2)^2 independent speckles,
/// 0.577 + ln n times the mean. Own estimate; good to a factor of ten, which is its band.
///
///   leaving_W  [W], >= 0
///   distance   [m], >= 0
///   throws     Error out_of_range
LeakEstimate leak_estimate(double frequency, double width, double height, double leaving_W,
                           double distance);

}  // namespace lossline::field
