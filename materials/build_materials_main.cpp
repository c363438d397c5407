// build_materials DATA_FOLDER SCHEMA_FILE OUTPUT: builds the shipped materials database.

#include <cstdio>
#include <exception>

#include "materials/build_database.h"

int main(int argc, char** argv) {
  if (argc != 4) {
    std::fputs("usage: build_materials DATA_FOLDER SCHEMA_FILE OUTPUT\n", stderr);
    return 2;
  }
  try {
    const auto report = lossline::materials::build_database(argv[1], argv[2], argv[3]);
    std::printf("%d materials, %d data sets, %d check values, %d sources\n", report.materials,
                report.datasets, report.goldens, report.sources);
    return 0;
  } catch (const std::exception& error) {
    std::fprintf(stderr, "%s\n", error.what());
    return 1;
  }
}
