#include "dropfront/problem/input_hash.hpp"

#include <fmt/format.h>

#include <fstream>
#include <iterator>

#include "dropfront/values/input_error.hpp"

namespace dropfront::problem {

std::string fnv1a_64(std::string_view bytes) {
  std::uint64_t hash = 0xcbf29ce484222325ULL;
  for (const char c : bytes) {
    hash ^= static_cast<unsigned char>(c);
    hash *= 0x100000001b3ULL;
  }
  return fmt::format("{:016x}", hash);
}

std::string hash_of_file(const std::string& path) {
  std::ifstream file(path, std::ios::binary);
  if (!file) throw values::InputError(path, "", "the file cannot be read");
  const std::string bytes{std::istreambuf_iterator<char>(file), std::istreambuf_iterator<char>()};
  if (file.bad()) throw values::InputError(path, "", "the file cannot be read");
  return fnv1a_64(bytes);
}

}  // namespace dropfront::problem
