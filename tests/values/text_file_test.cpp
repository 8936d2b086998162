#include "dropfront/values/text_file.hpp"

#include <cstdio>
#include <filesystem>
#include <fstream>

#include "dropfront/values/input_error.hpp"
#include "support/catch.hpp"

using namespace dropfront::values;

namespace {

std::string written(const std::string& content) {
  const auto path = std::filesystem::temp_directory_path() / "dropfront_text_file_test.txt";
  std::ofstream(path, std::ios::binary) << content;
  return path.string();
}

std::string refusal(const std::string& path) {
  try {
    read_text_file(path);
  } catch (const InputError& error) {
    return error.what();
  }
  return "accepted";
}

}  // namespace

TEST_CASE("A text file is read whole, without its byte order mark") {
  const std::string path = written("\xef\xbb\xbfpart,60 °C\r\n");
  CHECK(read_text_file(path) == "part,60 °C\r\n");
  std::filesystem::remove(path);
}

TEST_CASE("A file that cannot serve is refused by name") {
  CHECK(refusal("no/such/list.csv") == "no/such/list.csv: there is no such file");
  const std::string folder = std::filesystem::temp_directory_path().string();
  CHECK(refusal(folder) == folder + ": is a folder, a file is wanted");
  const std::string path = written("a,b\n°\xb0,2\n");
  CHECK(refusal(path) == path + ":2:2: holds a byte that is not UTF-8 text");
  std::filesystem::remove(path);
}

TEST_CASE("Valid and invalid UTF-8 are told apart at the table's edges") {
  // RFC 3629, section 4: well-formed ranges; overlong forms, surrogates and values past U+10FFFF are not.
  for (const char* good :
       {"", "abc", "\xc2\x80", "\xe0\xa0\x80", "\xed\x9f\xbf", "\xf0\x90\x80\x80", "\xf4\x8f\xbf\xbf"}) {
    CHECK_FALSE(first_invalid_utf8(good));
  }
  for (const char* bad : {"\x80", "\xc1\xbf", "\xe0\x9f\xbf", "\xed\xa0\x80", "\xf0\x8f\xbf\xbf",
                          "\xf4\x90\x80\x80", "\xf5\x80\x80\x80", "\xc2", "\xe2\x82"}) {
    CHECK(first_invalid_utf8(bad) == std::size_t{0});
  }
  CHECK(first_invalid_utf8("ok\xff") == std::size_t{2});
}

TEST_CASE("Places count characters, not bytes") {
  CHECK(line_and_column("abc", 0) == "1:1");
  CHECK(line_and_column("µF\nx", 3) == "1:3");
  CHECK(line_and_column("a\nbc", 3) == "2:2");
}
