#include "core/numerics/error.h"
#include "shell_samples.h"
#include "widgets/document/document.h"
#include "widgets/document/measurement_paths.h"
#include "widgets/document/recovery_copy.h"

#include <QDir>
#include <QFile>
#include <QSignalSpy>
#include <QTemporaryDir>
#include <gtest/gtest.h>

#include <random>

namespace cornerwright {
namespace {

class DocumentTest : public testing::Test {
  protected:
    DocumentTest() { document.reset(smallProject(), QString(), QDir::currentPath()); }

    ProjectPointer leadAt(double w) {
        return std::make_shared<const Project>(withLeadZero(start, w));
    }

    Document document;
    const Project start = smallProject();
};

TEST_F(DocumentTest, ADragIsOneUndoStepHoweverManyProposalsItTook) {
    document.beginDrag(QStringLiteral("Move zero"));
    for (int i = 1; i <= 50; ++i) {
        document.previewDrag(leadAt(25.0 + i));
    }
    document.commitDrag();
    EXPECT_EQ(document.project(), *leadAt(75.0));
    EXPECT_EQ(document.undoText(), QStringLiteral("Move zero"));
    document.undo();
    EXPECT_EQ(document.project(), start);
    EXPECT_FALSE(document.canUndo());
    document.redo();
    EXPECT_EQ(document.project(), *leadAt(75.0));
}

TEST_F(DocumentTest, ACancelledDragLeavesNothingBehind) {
    document.beginDrag(QStringLiteral("Move zero"));
    document.previewDrag(leadAt(80.0));
    EXPECT_TRUE(document.isModified());
    document.cancelDrag();
    EXPECT_EQ(document.project(), start);
    EXPECT_FALSE(document.canUndo());
    EXPECT_FALSE(document.isModified());
}

TEST_F(DocumentTest, ADragBackToItsStartIsNoStep) {
    document.beginDrag(QStringLiteral("Move zero"));
    document.previewDrag(leadAt(80.0));
    document.previewDrag(leadAt(25.0));
    document.commitDrag();
    EXPECT_FALSE(document.canUndo());
    EXPECT_FALSE(document.isModified());
}

TEST_F(DocumentTest, AnEditThatChangesNothingIsNoStep) {
    QSignalSpy changed(&document, &Document::projectChanged);
    EXPECT_FALSE(document.apply(start, QStringLiteral("nothing")));
    EXPECT_EQ(changed.count(), 0);
}

TEST_F(DocumentTest, AnEditDuringADragPutsTheDragBackFirst) {
    document.beginDrag(QStringLiteral("Move zero"));
    document.previewDrag(leadAt(80.0));
    Project renamed = start;
    renamed.title = "other";
    document.apply(renamed, QStringLiteral("Rename"));
    EXPECT_EQ(document.project(), renamed);
    document.undo();
    EXPECT_EQ(document.project(), start);
}

TEST_F(DocumentTest, UndoAndRedoWalkTheSameValuesBothWays) {
    std::mt19937 random(7);
    std::vector<Project> values{start};
    for (int i = 0; i < 200; ++i) {
        const double w = std::uniform_real_distribution<double>(1.0, 200.0)(random);
        ASSERT_TRUE(document.apply(*leadAt(w), QStringLiteral("step")));
        values.push_back(document.project());
    }
    for (auto value = values.rbegin(); value != values.rend(); ++value) {
        ASSERT_EQ(document.project(), *value);
        document.undo();
    }
    for (const Project& value : values) {
        ASSERT_EQ(document.project(), value);
        document.redo();
    }
}

TEST_F(DocumentTest, SavingIsWhatMakesItClean) {
    const QTemporaryDir folder;
    const QString path = folder.filePath(QStringLiteral("saved.cornerwright.json"));
    document.apply(*leadAt(40.0), QStringLiteral("step"));
    EXPECT_TRUE(document.isModified());
    document.save(path);
    EXPECT_FALSE(document.isModified());
    document.undo();
    EXPECT_TRUE(document.isModified());
    document.redo();
    EXPECT_FALSE(document.isModified());

    Document again;
    again.open(path);
    EXPECT_EQ(again.project(), document.project());
}

TEST_F(DocumentTest, AFileThatCannotBeReadChangesNothing) {
    const QTemporaryDir folder;
    const QString path = folder.filePath(QStringLiteral("broken.cornerwright.json"));
    QFile file(path);
    ASSERT_TRUE(file.open(QIODevice::WriteOnly));
    file.write("{\"cornerwright\": 1, \"titel\": \"slip\"}");
    file.close();
    EXPECT_THROW(document.open(path), InputError);
    EXPECT_EQ(document.project(), start);
}

TEST(MeasurementPaths, AreToldFromTheNewFolder) {
    Project project;
    MeasurementSource source;
    source.file = "measurements/unit7.csv";
    project.plant_cases.push_back({"unit 7", source});
    const Project moved =
        rebased(project, QStringLiteral("/data/belt"), QStringLiteral("/data/kept/here"));
    EXPECT_EQ(std::get<MeasurementSource>(moved.plant_cases[0].source).file,
              "../../belt/measurements/unit7.csv");
    EXPECT_EQ(rebased(moved, QStringLiteral("/data/kept/here"), QStringLiteral("/data/belt")),
              project);
}

TEST_F(DocumentTest, TheRecoveryCopyHoldsTheEditAndGoesWithTheSave) {
    const QTemporaryDir folder;
    RecoveryCopy recovery(document, folder.path());
    document.apply(*leadAt(40.0), QStringLiteral("step"));
    recovery.writeNow();
    ASSERT_TRUE(QFile::exists(recovery.copyPath()));
    document.save(folder.filePath(QStringLiteral("saved.cornerwright.json")));
    EXPECT_FALSE(QFile::exists(recovery.copyPath()));
}

TEST_F(DocumentTest, OnlyCopiesOfRunsThatAreGoneAreOffered) {
    const QTemporaryDir folder;
    RecoveryCopy mine(document, folder.path());
    document.apply(*leadAt(40.0), QStringLiteral("step"));
    mine.writeNow();
    // A copy without a lock: its run is gone.
    const QString left = folder.filePath(QStringLiteral("gone.recovery.json"));
    ASSERT_TRUE(QFile::copy(mine.copyPath(), left));

    Document other;
    RecoveryCopy theirs(other, folder.path());
    const std::vector<RecoverableProject> found = theirs.leftBehind();
    ASSERT_EQ(found.size(), 1u) << "the living run's own copy must not be offered";
    EXPECT_EQ(found[0].copyPath, left);
    theirs.recover(found[0]);
    EXPECT_EQ(other.project(), *leadAt(40.0));
    EXPECT_TRUE(other.isModified());
    EXPECT_FALSE(QFile::exists(left));
    EXPECT_TRUE(QFile::exists(theirs.copyPath()));
}

} // namespace
} // namespace cornerwright
