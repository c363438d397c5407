#pragma once
// Marks that travel with every evaluated material value, so that a result can say what it rests
// on. A line's result carries the union over everything it used.

#include <cstdint>

namespace lossline {

/// Bit set of marks; see the named constants.
struct Flags {
  std::uint32_t bits = 0;

  constexpr Flags operator|(Flags other) const { return {bits | other.bits}; }
  constexpr Flags& operator|=(Flags other) {
    bits |= other.bits;
    return *this;
  }
  [[nodiscard]] constexpr bool has(Flags other) const { return (bits & other.bits) != 0; }
  [[nodiscard]] constexpr bool none() const { return bits == 0; }
  constexpr bool operator==(const Flags&) const = default;
};

namespace flag {
inline constexpr Flags edge{1u << 0};           ///< within 2 % of the span of a range end
inline constexpr Flags extrapolated{1u << 1};   ///< outside the range, within its allowance
inline constexpr Flags clamped{1u << 2};        ///< outside the range, held at its end
inline constexpr Flags estimated{1u << 3};      ///< from composition by a general mixing model
inline constexpr Flags from_memory{1u << 4};    ///< the source is named but was not seen
inline constexpr Flags mixed_sources{1u << 5};  ///< joined from more than one publication
inline constexpr Flags default_uncertainty{1u << 6};  ///< the source states no uncertainty
inline constexpr Flags invented{1u << 7};  ///< demonstration value, describes nothing real
inline constexpr Flags assumed{1u << 8};   ///< put in by the user or by a stated default
inline constexpr Flags guarded{1u << 9};   ///< a physical bound (eps' >= 1, eps'' >= 0) acted
}  // namespace flag

/// A value with its marks.
template <class T>
struct Valued {
  T value{};
  Flags flags{};
};

}  // namespace lossline
