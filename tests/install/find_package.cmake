# Builds the example with find_package from the installed package only, and runs it.
#   cmake -DPREFIX=.. -DWORK=.. -DEXAMPLE=.. -DVERSION=.. -DGENERATOR=.. -DC_COMPILER=.. -DC_FLAGS=.. -P find_package.cmake
cmake_minimum_required(VERSION 3.25)
include(${CMAKE_CURRENT_LIST_DIR}/common.cmake)

file(REMOVE_RECURSE ${WORK})
step(${CMAKE_COMMAND} -G ${GENERATOR} -S ${CMAKE_CURRENT_LIST_DIR}/consumer -B ${WORK}
    -DCMAKE_PREFIX_PATH=${PREFIX} -DCMAKE_FIND_USE_PACKAGE_REGISTRY=OFF -DCMAKE_FIND_USE_CMAKE_SYSTEM_PATH=OFF
    -DCMAKE_C_COMPILER=${C_COMPILER} -DCMAKE_C_FLAGS=${C_FLAGS} -DEXAMPLE=${EXAMPLE} -DEXPECTED_VERSION=${VERSION})
step(${CMAKE_COMMAND} --build ${WORK})
check_example(${WORK}/pairs_example)
