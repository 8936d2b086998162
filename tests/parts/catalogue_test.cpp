#include "dropfront/parts/catalogue.hpp"

#include <unistd.h>

#include <filesystem>
#include <fstream>

#include "dropfront/values/input_error.hpp"
#include "support/catch.hpp"

namespace dropfront::parts {
namespace {

namespace fs = std::filesystem;

/// A folder of lists that goes with the test.
class Lists {
 public:
  Lists() : folder_(fs::temp_directory_path() / ("dropfront_lists_" + std::to_string(getpid()))) {
    fs::remove_all(folder_);
    fs::create_directories(folder_);
  }
  ~Lists() { fs::remove_all(folder_); }
  Lists(const Lists&) = delete;
  Lists& operator=(const Lists&) = delete;

  void write(const std::string& name, const std::string& content) const {
    std::ofstream(folder_ / name, std::ios::binary) << content;
  }
  std::string path() const { return folder_.string(); }
  /// What follows the folder's name in the refusal.
  std::string refusal() const {
    Catalogue catalogue;
    try {
      read_parts_folder(path(), catalogue);
    } catch (const values::InputError& error) {
      return std::string(error.what()).substr(path().size());
    }
    return "accepted";
  }

 private:
  fs::path folder_;
};

const std::string droppers = "part,capacitance,tolerance,rated_voltage\n";

TEST_CASE("A folder is read kind by kind in the order of its rows, and a second one is appended") {
  const Lists lists;
  lists.write("droppers.csv", droppers + "b,1 uF,10 %,310 V\na,470 nF,10 %,310 V\n");
  lists.write("fuses.csv", "part,rated_current\nf,100 mA\n");
  lists.write("notes.txt", "no list");
  Catalogue catalogue;
  read_parts_folder(lists.path(), catalogue);
  REQUIRE(catalogue.droppers.size() == 2);
  CHECK(catalogue.droppers[0].info.name == "b");
  CHECK(catalogue.droppers[1].capacitance_F == 470e-9);
  CHECK(catalogue.fuses.size() == 1);
  CHECK(catalogue.clamps.empty());
  lists.write("droppers.csv", droppers + "c,1 uF,10 %,310 V\n");
  lists.write("fuses.csv", "part,rated_current\n");
  read_parts_folder(lists.path(), catalogue);
  CHECK(catalogue.droppers.size() == 3);
  CHECK(catalogue.droppers[2].info.name == "c");
}

TEST_CASE("A fault in a cell names file, line, column and value") {
  const Lists lists;
  lists.write("droppers.csv", droppers + "a,470 nF,10 %,310 V\nb, 10 V,10 %,310 V\n");
  CHECK(lists.refusal() ==
        "/droppers.csv:3:4: capacitance '10 V' is a voltage, a capacitance is wanted, such as 470 nF");
  lists.write("droppers.csv", droppers + "a,470 nF,,310 V\n");
  CHECK(lists.refusal() == "/droppers.csv:2:1: tolerance is missing: every dropper needs it, such as 10 %");
  lists.write("droppers.csv", droppers + ",470 nF,10 %,310 V\n");
  CHECK(lists.refusal() == "/droppers.csv:2:1: part is missing: every row needs a name");
}

TEST_CASE("A fault in the header is told at the header") {
  const Lists lists;
  lists.write("droppers.csv", "part,capacitence,tolerance,rated_voltage\n");
  CHECK(lists.refusal() ==
        "/droppers.csv:1:6: a dropper has no column 'capacitence' (did you mean 'capacitance'?)");
  lists.write("droppers.csv", "part,capacitance,tolerance,capacitance\n");
  CHECK(lists.refusal() == "/droppers.csv:1:28: column 'capacitance' stands twice in the header");
  lists.write("droppers.csv", "part;capacitance;tolerance\n");
  CHECK(lists.refusal().find("separated by commas") != std::string::npos);
  lists.write("droppers.csv", "# nothing\n");
  CHECK(lists.refusal().find("the list is empty") != std::string::npos);
}

TEST_CASE("A part name used twice in a kind is refused, within a list and across folders") {
  const Lists lists;
  lists.write("droppers.csv", droppers + "a,1 uF,10 %,310 V\na,2.2 uF,10 %,310 V\n");
  CHECK(lists.refusal() ==
        "/droppers.csv:3:1: part 'a' stands already in line 2, names are unique within a kind");
  lists.write("droppers.csv", droppers + "a,1 uF,10 %,310 V\n");
  Catalogue catalogue;
  read_parts_folder(lists.path(), catalogue);
  CHECK_THROWS_AS(read_parts_folder(lists.path(), catalogue), values::InputError);
}

TEST_CASE("Folders that hold no list, and lists under another name, are refused") {
  const Lists lists;
  CHECK(lists.refusal().find("holds no parts list, allowed are droppers.csv") != std::string::npos);
  lists.write("dropper.csv", droppers);
  CHECK(lists.refusal().find("/dropper.csv: is no known parts list") == 0);
  CHECK(lists.refusal().find("did you mean 'droppers.csv'?") != std::string::npos);
  Catalogue catalogue;
  CHECK_THROWS_AS(read_parts_folder(lists.path() + "/none", catalogue), values::InputError);
}

}  // namespace
}  // namespace dropfront::parts
