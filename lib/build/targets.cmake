# Flags and the two functions by which every folder declares its library part and its tests.

add_library(isohydric_build_flags INTERFACE)
target_compile_features(isohydric_build_flags INTERFACE cxx_std_20)
target_compile_options(isohydric_build_flags INTERFACE
    # One answer for every machine: no fused multiply-add, no reassociation (see lib/README.md).
    -ffp-contract=off
    -Wall -Wextra -Wpedantic -Wshadow -Wconversion -Wsign-conversion -Wdouble-promotion
    -Wold-style-cast -Wcast-qual -Wswitch-enum -Wmissing-declarations -Wundef
    $<$<CXX_COMPILER_ID:GNU>:-Wduplicated-cond -Wduplicated-branches -Wlogical-op -Wuseless-cast -Wno-psabi>
    # False in g++ 12 for strings at -O3 (its bug 105651).
    $<$<CXX_COMPILER_ID:GNU>:-Wno-restrict>)
if(ISOHYDRIC_BUILD_FUZZERS)
    target_compile_options(isohydric_build_flags INTERFACE -fsanitize=fuzzer-no-link)
endif()
if(ISOHYDRIC_SANITIZE)
    target_compile_options(isohydric_build_flags INTERFACE
        -fsanitize=${ISOHYDRIC_SANITIZE} -fno-sanitize-recover=all -fno-omit-frame-pointer)
    target_link_options(isohydric_build_flags INTERFACE -fsanitize=${ISOHYDRIC_SANITIZE})
endif()
set(CMAKE_CXX_EXTENSIONS OFF)
set(CMAKE_CXX_VISIBILITY_PRESET hidden)
set(CMAKE_VISIBILITY_INLINES_HIDDEN ON)
set(CMAKE_POSITION_INDEPENDENT_CODE ON)

# isohydric_folder(<name> SOURCES a.cpp ... HEADERS a.hpp ... USES <folder> ... LINKS <target> ...)
# One folder of lib/isohydric: an object library that sees only the folders it names, and a part of the library.
function(isohydric_folder name)
    cmake_parse_arguments(PARSE_ARGV 1 arg "" "" "SOURCES;HEADERS;USES;LINKS")
    list(TRANSFORM arg_HEADERS PREPEND ${CMAKE_CURRENT_SOURCE_DIR}/)
    if(NOT arg_SOURCES)
        add_library(isohydric_${name} INTERFACE)
        target_include_directories(isohydric_${name} INTERFACE ${PROJECT_SOURCE_DIR}/lib)
        set(scope INTERFACE)
    else()
        add_library(isohydric_${name} OBJECT ${arg_SOURCES})
        target_include_directories(isohydric_${name} PUBLIC ${PROJECT_SOURCE_DIR}/lib)
        target_link_libraries(isohydric_${name} PRIVATE isohydric_build_flags ${arg_LINKS})
        target_sources(isohydric PRIVATE $<TARGET_OBJECTS:isohydric_${name}>)
        foreach(link IN LISTS arg_LINKS)
            get_target_property(kind ${link} TYPE)
            if(NOT kind STREQUAL "INTERFACE_LIBRARY")  # who links the archive needs no header-only library
                target_link_libraries(isohydric PRIVATE ${link})
            endif()
        endforeach()
        set(scope PUBLIC)
    endif()
    foreach(used IN LISTS arg_USES)
        target_link_libraries(isohydric_${name} ${scope} isohydric_${used})
    endforeach()
    target_sources(isohydric PUBLIC FILE_SET HEADERS FILES ${arg_HEADERS})
endfunction()

# isohydric_test(<name> SOURCES a_test.cpp ... LINKS <target> ... LABELS unit ...)
# One doctest program; a program that runs no test case fails.
function(isohydric_test name)
    cmake_parse_arguments(PARSE_ARGV 1 arg "" "" "SOURCES;LINKS;LABELS")
    add_executable(test_${name} ${arg_SOURCES})
    target_link_libraries(test_${name} PRIVATE isohydric_build_flags isohydric_test_main ${arg_LINKS})
    target_include_directories(test_${name} PRIVATE ${PROJECT_SOURCE_DIR}/lib ${PROJECT_SOURCE_DIR}/tests)
    target_compile_definitions(test_${name} PRIVATE ISOHYDRIC_SOURCE_DIR="${PROJECT_SOURCE_DIR}")
    add_test(NAME ${name} COMMAND test_${name})
    if(NOT arg_LABELS)
        set(arg_LABELS unit)
    endif()
    set_tests_properties(${name} PROPERTIES LABELS "${arg_LABELS}")
endfunction()
