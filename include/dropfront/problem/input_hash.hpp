#pragma once
#include <cstdint>
#include <string>
#include <string_view>

namespace dropfront::problem {

/// 64-bit FNV-1a as 16 hexadecimal digits. Recognises changed inputs; no protection against intent.
/// Source: offset basis and prime of draft-eastlake-fnv, section 5 [from memory].
std::string fnv1a_64(std::string_view bytes);

/// Of a file's bytes. Throws values::InputError when it cannot be read.
std::string hash_of_file(const std::string& path);

}  // namespace dropfront::problem
