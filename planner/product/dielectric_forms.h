#pragma once
// The published forms of the permittivity of products, in one include; each lives in its own pair:
//   plant_permittivity.h      leaves, fresh fruit and vegetables, wheat
//   mineral_permittivity.h    moist sand and clay, dry boards
//   segmented_permittivity.h  two straight segments about a critical moisture
//   estimated_permittivity.h  four phases by volume, for everything else
// Convention eps = eps' - j eps'' (time factor exp(+jwt)).

#include "planner/product/estimated_permittivity.h"  // IWYU pragma: export
#include "planner/product/mineral_permittivity.h"    // IWYU pragma: export
#include "planner/product/plant_permittivity.h"      // IWYU pragma: export
#include "planner/product/segmented_permittivity.h"  // IWYU pragma: export
