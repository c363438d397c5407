#include "planner/cli/options.h"

#include <CLI/CLI.hpp>
#include <algorithm>
#include <iostream>
#include <map>

#include "planner/base/nearest.h"
#include "planner/base/version.h"
#include "planner/cli/exit_codes.h"

namespace lossline::cli {
namespace {

constexpr const char* summary =
    "Plans industrial microwave drying and curing lines: where the power goes, what the product\n"
    "becomes, how far every limit is, and how sure any of it is. An estimate, never a certificate.";

constexpr const char* lesson = R"(A first line:
  lossline check quillfen.toml                  is the file sound, and what stream does it describe
  lossline solve quillfen.toml                  the answer on one page
  lossline solve quillfen.toml --set 'generator[1].set_point=50 kW'
                                                the same line with one value changed
  lossline solve quillfen.toml --format json --output answer.json
                                                everything, for a program to read
  lossline materials show carrot                what is known about a product, and how well

Quantities carry their unit ("0.42 m/min", "915 MHz"); moisture its basis ("25 % wb", "33 % db").
Exit codes: 0 done; 1 a limit is beyond or the solve did not converge; 2 bad input or usage;
130 interrupted. Complaints go to standard error as file:line:column: key: what is wrong; what is
right.)";

/// A word where a command should stand that is none: named, with the nearest one.
bool mistyped(const CLI::App& app, const std::string& word) {
  std::vector<std::string> known;
  for (const CLI::App* sub : app.get_subcommands([](const CLI::App*) { return true; }))
    known.push_back(sub->get_name());
  if (std::find(known.begin(), known.end(), word) != known.end()) return false;
  const std::string meant = nearest(word, known);
  std::cerr << "lossline: '" << word << "' is not a command of " << app.get_name() << "; "
            << (meant.empty() ? "there are " + listed(known) : "did you mean '" + meant + "'?")
            << '\n';
  return true;
}

struct Parser {
  CLI::App app{summary, "lossline"};
  Options options;
  std::string format = "text", units = "si";
  std::map<const CLI::App*, Command> commands;

  Parser();
  CLI::App* add(CLI::App& parent, const char* name, const char* what, Command command) {
    CLI::App* sub = parent.add_subcommand(name, what);
    commands[sub] = command;
    sub->footer("");
    return sub;
  }
  static void add_choice(CLI::App* sub, const char* name, std::string& value,
                         const std::vector<std::string>& words, const char* what) {
    std::string type;
    for (const std::string& word : words) type += (type.empty() ? "" : "|") + word;
    sub->add_option(name, value, what)
        ->check(CLI::IsMember(words).description(""))
        ->type_name(type);
  }
  void add_line_file(CLI::App* sub) {
    sub->add_option("file", options.file, "Line file (TOML)")->required();
    sub->add_option("--set", options.assignments,
                    "Change one value before reading, as in --set 'belt.speed=0.5 m/min'")
        ->take_all()
        ->expected(1)
        ->type_name("KEY=VALUE");
  }
};

Parser::Parser() {
  app.footer(lesson);
  app.set_version_flag("--version", std::string("lossline ") + program_version);
  app.require_subcommand(0, 1);
  app.get_formatter()->column_width(34);

  CLI::App* check =
      add(app, "check", "Check a line file and print the stream it describes", Command::check);
  add_line_file(check);
  add_choice(check, "--units", units, {"si", "us"}, "Units of what is printed");

  CLI::App* solve = add(app, "solve", "Solve a line and print the answer", Command::solve);
  add_line_file(solve);
  add_choice(solve, "--level", options.level, {"mean", "depth"},
             "Detail of the product model: mean over its depth");
  add_choice(solve, "--format", format, {"text", "json", "csv"},
             "One page, everything for a program, or the profile along the belt");
  add_choice(solve, "--units", units, {"si", "us"}, "Units of the page");
  solve->add_option("--output", options.output, "Write to this file instead of standard output")
      ->type_name("FILE");

  CLI::App* materials = app.add_subcommand("materials", "The materials database");
  materials->require_subcommand(0, 1);
  materials->footer("");
  add(*materials, "list", "All materials with the grade of what is known", Command::materials_list);
  CLI::App* show =
      add(*materials, "show", "Everything stored about one material", Command::materials_show);
  show->add_option("material", options.file, "Id, as in the list")->required();
  add(*materials, "check", "Prove the database against its published check values",
      Command::materials_check);
  CLI::App* import = add(*materials, "import", "Take in a measured permittivity series",
                         Command::materials_import);
  import->add_option("file", options.file, "CSV file with its metadata lines")->required();
  CLI::App* undo = add(*materials, "undo", "Take an import back", Command::materials_undo);
  undo->add_option("number", options.import_number, "Number the import printed")->required();
}

/// The first word of the command line, and the second after "materials".
bool words_are_commands(const Parser& parser, int argc, const char* const* argv) {
  if (argc < 2 || argv[1][0] == '-') return true;
  if (mistyped(parser.app, argv[1])) return false;
  if (std::string(argv[1]) != "materials" || argc < 3 || argv[2][0] == '-') return true;
  return !mistyped(*parser.app.get_subcommand("materials"), argv[2]);
}

}  // namespace

Options read_options(int argc, const char* const* argv) {
  Parser parser;
  Options& options = parser.options;
  options.exit_code = exit_bad_input;
  if (!words_are_commands(parser, argc, argv)) return options;
  try {
    parser.app.parse(argc, argv);
  } catch (const CLI::Success& e) {  // help or version
    parser.app.exit(e);
    options.exit_code = exit_ok;
    return options;
  } catch (const CLI::ParseError& e) {
    std::cerr << "lossline: " << e.what() << "; see lossline --help\n";
    return options;
  }
  for (const auto& [sub, command] : parser.commands)
    if (sub->parsed()) options.command = command;
  if (parser.format != "text")
    options.format = parser.format == "json" ? Format::json : Format::csv;
  if (parser.units == "us") options.units = UnitSet::us_customary;
  if (options.command == Command::none) {
    const CLI::App* materials = parser.app.get_subcommand("materials");
    std::cerr << (materials->parsed() ? materials->help("lossline") : parser.app.help());
  }
  return options;
}

}  // namespace lossline::cli
