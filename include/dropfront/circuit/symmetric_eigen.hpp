#pragma once
#include <array>

#include "dropfront/circuit/steady_state.hpp"

namespace dropfront::circuit {

using SmallMatrix = std::array<std::array<double, kMaxStates>, kMaxStates>;

/// Eigenvalues and orthonormal eigenvectors (columns of `vectors`) of the symmetric n x n matrix `s`, n <= 4.
/// Cyclic Jacobi rotations: unlike closed forms they keep full relative accuracy where the eigenvalues lie
/// many decades apart and the matrix is nearly diagonal, which is what a dropper beside a reservoir gives.
void symmetric_eigen(int n, SmallMatrix s, StateVector& values, SmallMatrix& vectors);

}  // namespace dropfront::circuit
