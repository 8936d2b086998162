// The one place that includes Catch: precompiled for every test program.
#pragma once
#include <catch2/catch.hpp>
